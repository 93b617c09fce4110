using System.Globalization;
using System.Security.Cryptography;
using CoreDesign.Magnetics.Materials;

namespace CoreDesign.Magnetics.Joints;

/// <summary>
/// The steel of a joint's sheets as the lattice needs it: flux density across the joint line against the field across it, for a
/// square cut (flux along the rolling direction) and for a 45° cut (polarization turns towards the field against the
/// crystal's anisotropy). Immutable; safe to share between threads.
/// </summary>
/// <remarks>
/// Past the curve's last point the polarization goes on to saturation as Js - J = c/H^n, n from the curve's end slope but held
/// within 0.5 and 2 (approach to saturation, textbook form 1/H to 1/H²).
/// </remarks>
public sealed class JointSteel
{
    /// <summary>
    /// Anisotropy constant of silicon iron with 3 % Si, J/m³; from memory. It sets how hard a sheet's polarization turns out of
    /// the rolling direction; 12 kJ/m³ bounds it from below where domains at 90° help.
    /// </summary>
    public const double DefaultRotationStiffness_J_per_m3 = 36e3;

    private const double Mu0 = MagneticConstants.Mu0_H_per_m;

    /// <summary>How far the last point's polarization may pass Js before the curve is refused.</summary>
    private const double SaturationTolerance_T = 5e-3;

    /// <summary>
    /// How far the interpolated polarization may fall before the curve is refused; within this it is held level. Few
    /// points between 5 and 100 kA/m make a smooth H(B) rise faster than 1/mu0 in places although every point is sound.
    /// </summary>
    private const double FallTolerance_T = 20e-3;
    private readonly LawAcrossLine _square;
    private readonly LawAcrossLine _mitred;

    /// <param name="fieldOfFluxDensity">Peak H in A/m against peak B in T along the rolling direction.</param>
    /// <param name="sheetThickness_m">0.05 mm to 1 mm.</param>
    /// <param name="saturationPolarization_T">1 T to 2.5 T, not below the curve's own polarization.</param>
    /// <param name="rotationStiffness_J_per_m3">Anisotropy constant K1, 3 kJ/m³ to 60 kJ/m³.</param>
    /// <exception cref="ArgumentException">A figure outside its range, or a curve that is not a magnetization curve.</exception>
    public JointSteel(
        MonotoneCurve fieldOfFluxDensity,
        double sheetThickness_m,
        double saturationPolarization_T,
        double rotationStiffness_J_per_m3 = DefaultRotationStiffness_J_per_m3)
    {
        ArgumentNullException.ThrowIfNull(fieldOfFluxDensity);
        JointLimits.Hold(nameof(sheetThickness_m), "Sheet thickness", sheetThickness_m * 1e3, 0.05, 1, "mm");
        JointLimits.Hold(nameof(saturationPolarization_T), "Saturation polarization", saturationPolarization_T, 1, 2.5, "T");
        JointLimits.Hold(nameof(rotationStiffness_J_per_m3), "Rotation stiffness", rotationStiffness_J_per_m3 / 1e3, 3, 60, "kJ/m³");
        SheetThickness_m = sheetThickness_m;
        SaturationPolarization_T = saturationPolarization_T;
        RotationStiffness_J_per_m3 = rotationStiffness_J_per_m3;
        _square = LawAcrossLine.Tabulate(new RollingDirection(fieldOfFluxDensity, saturationPolarization_T).PolarizationAt);
        _mitred = LawAcrossLine.Tabulate(new Turning(_square, saturationPolarization_T, rotationStiffness_J_per_m3).PolarizationAt);
        Fingerprint = Digest();
    }

    public double SheetThickness_m { get; }
    public double SaturationPolarization_T { get; }
    public double RotationStiffness_J_per_m3 { get; }

    /// <summary>
    /// Relative permeability through the sheet's thickness, where the flux can only pass by turning:
    /// 1 + Js²/(2 mu0 K1), small angles of rotation.
    /// </summary>
    public double NormalPermeability =>
        1 + (SaturationPolarization_T * SaturationPolarization_T / (2 * Mu0 * RotationStiffness_J_per_m3));

    /// <summary>Equal for equal steels and stable between runs: a key for a cache of joint tables.</summary>
    public string Fingerprint { get; }

    /// <summary>Builds a steel from its own tables; beyond the last point of the curve only mu0 adds flux.</summary>
    /// <exception cref="ArgumentException">As the constructor.</exception>
    public static JointSteel From(SteelData steel, double rotationStiffness_J_per_m3 = DefaultRotationStiffness_J_per_m3)
    {
        ArgumentNullException.ThrowIfNull(steel);
        var b = steel.Magnetization.Select(p => p.B_T).ToArray();
        var h = steel.Magnetization.Select(p => p.H_A_per_m).ToArray();
        return new JointSteel(
            new MonotoneCurve(b, h, 1 / Mu0), steel.SheetThickness_m, steel.SaturationPolarization_T, rotationStiffness_J_per_m3);
    }

    /// <summary>
    /// Flux density across the joint line, T, of a sheet under a field across it, A/m. Odd, rising.
    /// </summary>
    public double FluxDensityAcross(double field_A_per_m, bool mitred) => LawOf(mitred).FluxDensity(field_A_per_m);

    internal LawAcrossLine LawOf(bool mitred) => mitred ? _mitred : _square;

    private string Digest()
    {
        using var hash = IncrementalHash.CreateHash(HashAlgorithmName.SHA256);
        Span<byte> bytes = stackalloc byte[sizeof(double)];
        foreach (var value in (double[])[SheetThickness_m, SaturationPolarization_T, RotationStiffness_J_per_m3, .. _square.Polarization])
        {
            System.Buffers.Binary.BinaryPrimitives.WriteDoubleLittleEndian(bytes, value);
            hash.AppendData(bytes);
        }

        return Convert.ToHexStringLower(hash.GetHashAndReset());
    }

    /// <summary>J(H) along the rolling direction: the curve turned over, then the approach to saturation.</summary>
    private sealed class RollingDirection
    {
        private readonly MonotoneCurve _curve;
        private readonly double _saturation;
        private readonly double _lastPolarization;
        private readonly double _exponent;
        private double _flux;
        private double _highest;

        public RollingDirection(MonotoneCurve curve, double saturation)
        {
            _curve = curve;
            _lastPolarization = curve.LastX - (Mu0 * curve.LastY);
            if (_lastPolarization <= 0 || _lastPolarization > saturation + SaturationTolerance_T)
            {
                throw new ArgumentException(
                    string.Create(CultureInfo.InvariantCulture, $"Magnetization curve: at its last point ({curve.LastX:g5} T, {curve.LastY:g5} A/m) the polarization is {_lastPolarization:g5} T; allowed is above 0 and up to the saturation polarization, {saturation:g4} T. Correct the last point or the saturation polarization."),
                    nameof(curve));
            }

            _saturation = Math.Max(saturation, _lastPolarization);
            curve.Value(curve.LastX * (1 - 1e-9), out var reluctivity);
            var polarizationSlope = Math.Max(0, (1 / reluctivity) - Mu0);
            var missing = _saturation - _lastPolarization;
            _exponent = missing > 0 ? Math.Min(Math.Max(polarizationSlope * curve.LastY / missing, 0.5), 2) : 1;
        }

        public double PolarizationAt(double field)
        {
            if (field >= _curve.LastY)
            {
                return Rising(_saturation - ((_saturation - _lastPolarization) * Math.Pow(_curve.LastY / field, _exponent)), field);
            }

            _flux = RisingRoot.Find(b => (_curve.Value(b, out var slope) - field, slope), _flux, _curve.LastX);
            return Rising(_flux - (Mu0 * field), field);
        }

        private double Rising(double polarization, double field)
        {
            if (polarization < _highest - FallTolerance_T)
            {
                throw new ArgumentException(
                    string.Create(CultureInfo.InvariantCulture, $"Magnetization curve: the polarization B - mu0·H falls from {_highest:g5} T to {polarization:g5} T at {field:g4} A/m; it must never fall. Check the points near that field."),
                    nameof(field));
            }

            _highest = Math.Max(_highest, polarization);
            return _highest;
        }
    }

    /// <summary>
    /// Component normal to a 45° line when the field is normal to it. The angle th by which the polarization has left the
    /// rolling direction balances Js·H·sin(45° - th) with the torque of a (110)[001] crystal,
    /// K1·sin(2th)·(sin²(th)/2 + cos(2th)).
    /// </summary>
    private sealed class Turning(LawAcrossLine alongRolling, double saturation, double stiffness)
    {
        private double _angle;

        public double PolarizationAt(double field)
        {
            _angle = RisingRoot.Find(th => Torque(th, field), _angle, Math.PI / 4);
            var along = field / Math.Sqrt(2);
            return (alongRolling.FluxDensity(along) - (Mu0 * along)) * Math.Cos((Math.PI / 4) - _angle);
        }

        private (double Value, double Slope) Torque(double th, double field)
        {
            var (sin, cos) = Math.SinCos(th);
            var (sin2, cos2) = Math.SinCos(2 * th);
            var shape = (0.5 * sin * sin) + cos2;
            var away = (Math.PI / 4) - th;
            return ((stiffness * sin2 * shape) - (saturation * field * Math.Sin(away)),
                (stiffness * ((2 * cos2 * shape) + (sin2 * ((sin * cos) - (2 * sin2))))) + (saturation * field * Math.Cos(away)));
        }
    }
}
