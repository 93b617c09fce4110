using System.Globalization;
using CoreDesign.Estimating.Contracts;
using CoreDesign.Magnetics.Circuits;
using CoreDesign.Magnetics.Geometry;

namespace CoreDesign.Estimating.Estimate;

/// <summary>Reads core form, units, phases and connection, and whether they fit together.</summary>
internal sealed class PhaseReader(DesignResolver resolver)
{
    public CoreForm? Form(string? form)
    {
        var read = CoreForms.TryFind(form);
        if (read is null)
        {
            resolver.Say("core.form", form is null
                ? $"The core form is missing. Give {CoreForms.Names}."
                : $"Core form '{DesignResolver.Cut(form)}' is not known here. Give {CoreForms.Names}.");
        }

        return read;
    }

    /// <summary>1 or 3.</summary>
    public int Units(CoreInput core, OrderInput order, CoreForm? form)
    {
        if (core.Units is not { } units)
        {
            return 1;
        }

        if (double.IsNaN(resolver.Needed("core.units", units)))
        {
            return 1;
        }

        if (units == 2)
        {
            resolver.Say("core.units", string.Create(CultureInfo.InvariantCulture, $"Units {units} is neither 1 nor 3. Give 1 for one core, or 3 for a bank of single-phase units."));
            return 1;
        }

        if (units == 3 && form is { } f && !CoreForms.IsSinglePhase(f))
        {
            resolver.Say("core.units", $"Units 3 does not fit the core form {core.Form}, which has three phases on one core. Give 1, or a single-phase form.");
            return 1;
        }

        return units;
    }

    /// <summary>Null where the form leaves no choice.</summary>
    public int? WoundLimbs(CoreInput core, CoreForm? form)
    {
        if (form != CoreForm.SinglePhaseTwoLimb)
        {
            if (core.WoundLimbs is not null && form is not null)
            {
                resolver.Say("core.woundLimbs", $"Wound limbs are a choice of two-limb cores; {core.Form} has its windings on fixed limbs. Leave it out.");
            }

            return null;
        }

        var wound = resolver.Optional("core.woundLimbs", core.WoundLimbs, DesignDefaults.WoundLimbs);
        return double.IsNaN(wound) ? null : (int)wound;
    }

    public SupplyConnection? Connection(string? connection, CoreForm? form, int units)
    {
        var single = form is { } f && CoreForms.IsSinglePhase(f) && units == 1;
        if (connection is null)
        {
            resolver.Derive("excitedWinding.connection");
            return single ? SupplyConnection.Single : SupplyConnection.StarWithNeutral;
        }

        var read = Connections.Parse(connection);
        if (read is null)
        {
            resolver.Say("excitedWinding.connection", $"Connection '{DesignResolver.Cut(connection)}' is not known. Give single, YN, Y or D.");
        }
        else if (form is not null && (read == SupplyConnection.Single) != single)
        {
            resolver.Say("excitedWinding.connection", single
                ? $"Connection '{connection}' does not fit a single-phase core. Give single, or core.units 3 for a bank."
                : $"Connection 'single' does not fit a {Words(form.Value)}. Give YN, Y or D.");
        }

        return read;
    }

    public void Check(OrderInput order, CoreInput core, CoreForm? form, int units)
    {
        if (order.Phases is not { } phases)
        {
            resolver.Derive("order.phases");
            return;
        }

        if (phases is not (1 or 3))
        {
            resolver.Say("order.phases", string.Create(CultureInfo.InvariantCulture, $"Phases {phases} is neither 1 nor 3. Give 1 or 3."));
        }
        else if (form is { } f && (phases == 1) != (CoreForms.IsSinglePhase(f) && units == 1))
        {
            var bank = units == 3 ? " in a bank" : "";
            resolver.Say("order.phases", string.Create(CultureInfo.InvariantCulture, $"Phases {phases} does not fit the core form {core.Form}{bank}. Change one of the two."));
        }
    }

    private static string Words(CoreForm form) => form switch
    {
        CoreForm.ThreeLimb => "three-limb core",
        CoreForm.FiveLimb => "five-limb core",
        _ => "bank of three units",
    };
}
