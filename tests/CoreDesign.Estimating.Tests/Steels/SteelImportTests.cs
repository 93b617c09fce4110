using System.Text;
using CoreDesign.Estimating.Steels;
using CoreDesign.Estimating.Steels.Import;

namespace CoreDesign.Estimating.Tests.Steels;

public sealed class SteelImportTests
{
    private static string Sample => File.ReadAllText(Path.Combine(AppContext.BaseDirectory, "Steels", "Samples", "own_steel_semicolon.csv"));

    private static SteelImportPreview ReadSample(params (string Old, string New)[] changes)
    {
        var text = Sample;
        foreach (var (old, @new) in changes)
        {
            Assert.Contains(old, text, StringComparison.Ordinal);
            text = text.Replace(old, @new, StringComparison.Ordinal);
        }

        return SteelImport.Read(Encoding.UTF8.GetBytes(text), "own.csv");
    }

    private static void AssertError(SteelImportPreview preview, string message)
    {
        Assert.False(preview.Ok);
        Assert.Null(preview.Grade);
        Assert.Contains(message, preview.Errors.Select(e => e.Message));
    }

    [Fact]
    public void Templates_can_be_imported_as_they_are_and_agree()
    {
        var point = SteelImport.Read(SteelImport.Template, null);
        var comma = SteelImport.Read(SteelImport.TemplateWithDecimalComma, null);
        Assert.Empty(point.Errors);
        Assert.Empty(point.Warnings);
        Assert.Equal(SteelCatalog.RevisionOf(point.Grade!), SteelCatalog.RevisionOf(comma.Grade!));
        Assert.Equal("text, comma separated, decimal point", point.ReadAs);
        Assert.Equal("text, semicolon separated, decimal comma", comma.ReadAs);
        Assert.Equal([50.0, 60.0], point.Grade!.Rolling.Loss.Select(c => c.Frequency_Hz));
        Assert.Equal(1.85, point.Grade.Rolling.ExcitingPower.Single().Points[^1].Power_VA_per_kg);
        Assert.Equal(0.965, point.Grade.MinimumStackingFactor!.Value);
    }

    [Fact]
    public void Sample_becomes_a_certificate_with_its_source()
    {
        var preview = ReadSample();
        Assert.Empty(preview.Errors);
        Assert.Empty(preview.Warnings);
        var grade = preview.Grade!;
        Assert.Equal("Bänder Nr. 17/3", grade.Name);
        Assert.Equal(SteelStanding.Certificate, grade.Standing);
        Assert.Empty(grade.StandingText);
        Assert.Equal(new SourcedFigure(0.27, "Prüfzeugnis 2026-11 (file own.csv)", "works"), grade.Thickness_mm);
        Assert.Equal(8, grade.Rolling.Magnetization.Count);
        Assert.Equal(new(1.7, 78), grade.Rolling.Magnetization[4]);
        var steel = grade.ToSteelData();
        Assert.Equal(0.27e-3, steel.SheetThickness_m, 12);
        Assert.Equal(4.8e-7, steel.Resistivity_ohm_m);
        Assert.Equal(0.98, steel.Loss.Single().Points[4].Loss_W_per_kg);
        Assert.True(new SteelCatalog([grade]).TryFind("Bänder Nr. 17/3", out _));
    }

    [Fact]
    public void Encodings_and_separators_give_the_same_steel()
    {
        var expected = SteelCatalog.RevisionOf(ReadSample().Grade!);
        Encoding[] encodings = [new UTF8Encoding(true), Encoding.Unicode, Encoding.BigEndianUnicode];
        foreach (var encoding in encodings)
        {
            byte[] bytes = [.. encoding.GetPreamble(), .. encoding.GetBytes(Sample)];
            Assert.Equal(expected, SteelCatalog.RevisionOf(SteelImport.Read(bytes, null).Grade!));
        }

        var tabs = SteelImport.Read(Sample.Replace(';', '\t').ReplaceLineEndings("\r\n"), null);
        Assert.Equal(expected, SteelCatalog.RevisionOf(tabs.Grade!));
        var commas = SteelImport.Read(Sample.Replace(',', '.').Replace(';', ',').ReplaceLineEndings("\r"), null);
        Assert.Equal(expected, SteelCatalog.RevisionOf(commas.Grade!));
        var quoted = SteelImport.Read(Sample.Replace("1,7;78", "\"1,7\";\"78\"", StringComparison.Ordinal), null);
        Assert.Equal(expected, SteelCatalog.RevisionOf(quoted.Grade!));
    }

    [Fact]
    public void Latin1_is_read_with_a_warning()
    {
        var preview = SteelImport.Read(Encoding.Latin1.GetBytes(Sample), null);
        Assert.Equal("Bänder Nr. 17/3", preview.Grade!.Name);
        Assert.Equal(
            "The file is not UTF-8 and was read as Latin-1; check the name for odd letters, or save it as CSV, UTF-8.",
            Assert.Single(preview.Warnings).Message);
    }

    [Fact]
    public void Rows_and_columns_may_stand_in_any_order()
    {
        var lines = Sample.Split('\n', StringSplitOptions.RemoveEmptyEntries);
        var turned = lines.Select(l => l.Split(';')).Select((c, i) => i < 9 ? string.Join(';', c) : string.Join(';', c.Reverse())).ToList();
        turned.Reverse(10, turned.Count - 10);
        var preview = SteelImport.Read(string.Join('\n', turned), null);
        Assert.Empty(preview.Errors);
        Assert.Equal(SteelCatalog.RevisionOf(ReadSample().Grade!), SteelCatalog.RevisionOf(preview.Grade!));
    }

    [Fact]
    public void What_is_left_out_is_taken_and_said()
    {
        var preview = ReadSample(("density_kg_m3;7650;;\n", ""), ("resistivity_ohm_m;4,8E-07;;\n", ""), ("stackingFactor;0,95;;\n", ""));
        Assert.Equal(
            ["density_kg_m3: is left out; 7650 kg/m³ is taken (read).", "resistivity_ohm_m: is left out; 4.8E-07 Ωm is taken (from memory)."],
            preview.Warnings.Select(w => w.Message));
        Assert.Equal(7650, preview.Grade!.Density_kg_per_m3.Value);
        Assert.Equal("from memory", preview.Grade.Resistivity_ohm_m.Standing);
        Assert.Null(preview.Grade.MinimumStackingFactor);
    }

    [Theory]
    [InlineData("thickness_mm;0,27", "thickness_mm;270", "Line 4, thickness_mm: \"270\" must lie between 0.1 and 0.65 mm; this looks like micrometres: write 0.27.")]
    [InlineData("thickness_mm;0,27;;", "thickness_mm", "Line 4, thickness_mm: \"\" is empty; give the number or leave the whole row out.")]
    [InlineData("thickness_mm;0,27;;\n", "", "thickness_mm: is missing: give the sheet thickness, 0.1 to 0.65 mm.")]
    [InlineData("density_kg_m3;7650", "density_kg_m3;7,65", "Line 5, density_kg_m3: \"7,65\" must lie between 7000 and 8200 kg/m³; this looks like kg/dm³: write 7650.")]
    [InlineData("resistivity_ohm_m;4,8E-07", "resistivity_ohm_m;0,48", "Line 6, resistivity_ohm_m: \"0,48\" must lie between 1E-07 and 1.5E-06 Ωm; this looks like µΩm: write 0.48e-6.")]
    [InlineData("resistivity_ohm_m;4,8E-07", "resistivity_ohm_m;48", "Line 6, resistivity_ohm_m: \"48\" must lie between 1E-07 and 1.5E-06 Ωm; this looks like µΩcm: write 48e-8.")]
    [InlineData("saturationPolarization_T;2,03", "saturationPolarization_T;20,3", "Line 7, saturationPolarization_T: \"20,3\" must lie between 1.5 and 2.2 T; this looks like kG: write 2.03.")]
    [InlineData("stackingFactor;0,95", "stackingFactor;95", "Line 8, stackingFactor: \"95\" must lie between 0.8 and 1; this looks like per cent: write 0.95.")]
    [InlineData("thickness_mm;", "thicknes;", "Line 4, first cell: \"thicknes\" is no key of the format; nearest: thickness_mm, name.")]
    [InlineData("density_kg_m3;7650", "thickness_mm;0,23", "Line 5, thickness_mm: occurs twice (line 4); keep one of the two rows.")]
    [InlineData("stackingFactor;0,95;;", "stackingFactor;0;95;", "Line 8, stackingFactor: has 2 values; leave the cells after the value empty.")]
    [InlineData("name;Bänder Nr. 17/3;;\n", "", "name: is missing: give 1 to 80 characters.")]
    [InlineData("source;Prüfzeugnis 2026-11", "source;", "Line 3, source: is missing: give 1 to 200 characters.")]
    [InlineData("Bänder Nr. 17/3", "M105-30P", "name: \"M105-30P\" is the name of a built-in grade; add the coil or certificate number.")]
    [InlineData("Bänder Nr. 17/3", "a\u202Eb", "Line 2, name: \"a\u202Eb\" holds control or invisible characters; type it again as plain text.")]
    [InlineData("kind;frequency_Hz;B_T;value", "kind;f;B_T;value", "Line 10, header: lacks the column frequency_Hz.")]
    [InlineData("kind;frequency_Hz;B_T;value", "kind;f;B_T;value", "Line 10, header: \"f\" is no column of the format; the columns are kind, frequency_Hz, B_T, value.")]
    [InlineData("kind;frequency_Hz;B_T;value", "kind;frequency_Hz;J_T;value", "The file has no header row of a table; it needs a row with the columns kind, frequency_Hz, B_T, value, separated by comma, semicolon or tab.")]
    [InlineData("loss;50;1,0;0,315", "los;50;1,0;0,315", "Line 21, kind: \"los\" is no kind of table; nearest: loss. Kinds are magnetization, loss, excitingPower.")]
    [InlineData("loss;50;1,0;0,315", "loss;;1,0;0,315", "Line 21, frequency_Hz: \"\" is empty; give the number or leave the whole row out.")]
    [InlineData("loss;50;1,0;0,315", "loss;50;1,0;0,315;9", "Line 21: the row has 5 cells where the header has 4; leave the cells after the last column empty.")]
    [InlineData("loss;50;1,0;0,315", "loss;5;1,0;0,315", "Line 21, frequency_Hz: \"5\" must be a frequency from 10 to 1000 Hz; check the column.")]
    [InlineData("loss;50;1,0;0,315", "loss;50;1,0;-0,315", "Line 21, value: \"-0,315\" must be a loss from 0.000001 to 200 W/kg; leave the row out where nothing was measured.")]
    [InlineData("loss;50;1,0;0,315", "loss;50;-1,0;0,315", "Line 21, B_T: \"-1,0\" must be a peak flux density from 0.001 to 2.2 T; peak values are above zero; leave this row out.")]
    [InlineData("loss;50;1,0;0,315", "loss;50;10;0,315", "Line 21, B_T: \"10\" must be a peak flux density from 0.001 to 2.2 T; if the column is in kG, divide by 10.")]
    [InlineData("loss;50;1,0;0,315", "loss;50;1000;0,315", "Line 21, B_T: \"1000\" must be a peak flux density from 0.001 to 2.2 T; if the column is in mT, divide by 1000.")]
    [InlineData("loss;50;1,0;0,315", "loss;50;1,0;1e308", "Line 21, value: \"1e308\" must be a loss from 0.000001 to 200 W/kg; check the unit.")]
    [InlineData("loss;50;1,0;0,315", "loss;50;1,0;1e999", "Line 21, value: \"1e999\" is too large for a number; check the exponent.")]
    [InlineData("loss;50;1,0;0,315", "loss;50;1,0;NaN", "Line 21, value: \"NaN\" is not a finite number; leave the row out where nothing was measured.")]
    [InlineData("loss;50;1,0;0,315", "loss;50;1,0;-Infinity", "Line 21, value: \"-Infinity\" is not a finite number; leave the row out where nothing was measured.")]
    [InlineData("loss;50;1,0;0,315", "loss;50;1,0;#DIV/0!", "Line 21, value: \"#DIV/0!\" is not a finite number; leave the row out where nothing was measured.")]
    [InlineData("loss;50;1,0;0,315", "loss;50;1,0;0,315 W/kg", "Line 21, value: \"0,315 W/kg\" is not a number; write digits with a decimal point or comma, no unit and no thousands marks.")]
    [InlineData("magnetization;50;1,9;1050", "magnetization;50;1,9;1.050,0", "Line 18, value: \"1.050,0\" has more than one point or comma; write it without thousands marks.")]
    [InlineData("magnetization;50;1,9;1050", "magnetization;50;1,9;1.050", "Line 18, value: \"1.050\" has a point, the rest of the file decimal commas; write it without thousands marks, or with the same decimal mark as the rest.")]
    [InlineData("magnetization;50;1,9;1050", "magnetization;50;1,9;1050.5", "Line 4, thickness_mm: \"0,27\" has a decimal comma, other numbers of the file a decimal point; use one of them throughout.")]
    [InlineData("magnetization;50;1,3;20,5", "magnetization;50;1,3;14,5", "Line 14, value: \"14,5\" must rise with flux density: 14.5 A/m at 1.3 T follows 14.6 A/m at 1 T (line 13). Correct or leave out one of the two.")]
    [InlineData("magnetization;50;1,3;20,5", "magnetization;50;1,0;20,5", "Line 14, B_T: \"1,0\" occurs twice in this table (line 13); keep one of the two rows.")]
    [InlineData("magnetization;50;1,3;20,5", "magnetization;60;1,3;20,5", "Line 14, frequency_Hz: differs from the other magnetization rows; give one peak curve, at one frequency, and leave the others out.")]
    [InlineData("magnetization;50;2,0;6500", "magnetization;50;2,1;6500", "Line 19, B_T: \"2,1\" is beyond saturation: less µ0·H it leaves a polarization of 2.092 T, above the saturation polarization 2.03 T. Is H in kA/m, or the saturation polarization of this steel higher?")]
    [InlineData("magnetization;50;2,0;6500", "magnetization;50;1,91;65000", "Line 19, B_T: \"1,91\" is too low for its field of 65000 A/m: less µ0·H the polarization falls from 1.899 to 1.828 T. Is this column polarization? Flux density is polarization plus µ0·H.")]
    [InlineData("magnetization;50;0,5;8,4", "magnetization;50;0,5;0,0084", "Line 12, value: \"0,0084\" is far too low a peak field: the loss at 0.5 T and 50 Hz alone needs 6.503 A/m. Is H in A/m, peak, and not in kA/m, A/cm or Oe?")]
    [InlineData("loss;50;1,3;0,525", "loss;50;1,3;0,1", "Line 22, value: \"0,1\" must rise with flux density: 0.1 W/kg at 1.3 T follows 0.315 W/kg at 1 T (line 21). Correct or leave out one of the two.")]
    [InlineData("thickness_mm;0,27", "thickness_mm;0,60", "Line 23, value: \"0,71\" is a loss below the classical eddy part of 0.9071 W/kg at 1.5 T and 50 Hz in sheet of 0.6 mm. Is it W/kg, and are frequency, thickness and resistivity right?")]
    [InlineData("loss;50;1,8;1,17\n", "loss;50;1,8;1,17\nexcitingPower;50;1,7;0,83\n", "Line 26, value: \"0,83\" is an exciting power below the loss of 0.98 W/kg at 1.7 T and 50 Hz, which it contains. Are the two columns swapped?")]
    [InlineData("loss;50;1,8;1,17\n", "loss;60;1,0;0,3\nloss;60;1,3;0,7\nloss;60;1,5;0,9\nloss;60;1,7;1,3\n", "Line 25, value: \"0,3\" is a loss at 60 Hz that is not above the one at 50 Hz (0.315 W/kg at 1 T). Are the frequencies swapped?")]
    public void Bad_row_is_named_with_line_column_value_rule_and_mend(string old, string @new, string message) =>
        AssertError(ReadSample((old, @new)), message);

    [Fact]
    public void Too_few_points_are_counted_by_table()
    {
        var preview = ReadSample(
            ("magnetization;50;1,5;31,5\nmagnetization;50;1,7;78\nmagnetization;50;1,8;205\nmagnetization;50;1,9;1050\nmagnetization;50;2,0;6500\n", ""),
            ("loss;50;1,5;0,71\nloss;50;1,7;0,98\nloss;50;1,8;1,17\n", ""));
        Assert.Equal(
            [
                "magnetization: has 3 points; at least 5 are needed besides the origin. Add measured points.",
                "magnetization: ends at 1.3 T; at least one point at 1.5 T or above is needed. Add the upper part of the curve.",
                "loss at 50 Hz: has 3 points; at least 4 are needed besides the origin. Add measured points.",
            ],
            preview.Errors.Select(e => e.Message));
    }

    [Fact]
    public void Missing_tables_are_named()
    {
        var text = Sample[..Sample.IndexOf("magnetization", StringComparison.Ordinal)];
        var preview = SteelImport.Read(text, null);
        Assert.Equal(
            [
                "magnetization: has 0 points; at least 5 are needed besides the origin. Add measured points.",
                "loss: is missing: give at least 4 points at one frequency or more.",
            ],
            preview.Errors.Select(e => e.Message));
    }

    [Fact]
    public void Doubtful_data_is_taken_with_a_warning()
    {
        var preview = ReadSample(
            ("magnetization;50;1,0;14,6", "magnetization;50;1,0;11,2"),
            ("magnetization;50;1,9;1050\nmagnetization;50;2,0;6500\n", "magnetization;50;1,79;175\n"),
            ("magnetization;50;1,8;205\n", ""),
            ("loss;50;1,7;0,98\nloss;50;1,8;1,17\n", "loss;60;0,5;0,1\nloss;60;1,0;0,41\nloss;60;1,3;0,69\nloss;60;1,5;0,93\n"));
        Assert.True(preview.Ok);
        Assert.Equal(
            [
                "Line 13, value: \"11,2\" is below the 12.049 A/m that the loss at 1 T and 50 Hz alone needs. Is it an rms value, or the curve a static one? The peak curve belongs to the frequency of the loss.",
                "Line 22, value: \"0,1\" is 1.176 times the loss at 50 Hz (0.5 T); between hysteresis alone and eddy currents alone lie 1.2 and 1.44. The split of the loss into its parts will be poor.",
                "magnetization: ends at 1.79 T; a design above that leaves the measured range. Add points up to 1.8 T if you have them.",
                "loss at 50 Hz: ends at 1.5 T; a design above that leaves the measured range. Add points up to 1.7 T if you have them.",
                "loss at 60 Hz: ends at 1.5 T; a design above that leaves the measured range. Add points up to 1.7 T if you have them.",
            ],
            preview.Warnings.Select(w => w.Message));
    }

    [Fact]
    public void Lone_thousand_or_fraction_is_refused_as_ambiguous()
    {
        var lines = new[]
        {
            "name;x", "source;y", "thickness_mm;1,234", "kind;frequency_Hz;B_T;value", "loss;50;1;2",
        };
        var preview = SteelImport.Read(string.Join('\n', lines), null);
        AssertError(preview, "Line 3, thickness_mm: \"1,234\" can be read as a thousand or as a decimal comma, and no other number of the file tells which; write it with a decimal point, or without thousands marks.");
    }

    [Fact]
    public void Decimal_commas_in_a_comma_separated_file_are_explained()
    {
        var preview = SteelImport.Read(Sample.Replace(';', ','), null);
        AssertError(preview, "Line 12: the row has 6 cells where the header has 4; decimal commas need semicolons or tabs between the cells.");
        AssertError(preview, "Line 4, thickness_mm: has 2 values; put a text with commas in quotation marks, and write decimal points.");
    }

    [Fact]
    public void All_errors_come_at_once_in_the_order_of_lines()
    {
        var preview = ReadSample(("thickness_mm;0,27", "thickness_mm;27"), ("loss;50;1,0;0,315", "loss;50;1,0;x"), ("magnetization;50;1,3;20,5", "magnetization;50;1,3;y"));
        Assert.Equal([4, 14, 21], preview.Errors.Select(e => e.Line));
        Assert.Equal(["thickness_mm", "value", "value"], preview.Errors.Select(e => e.Column));
        Assert.Equal(["27", "y", "x"], preview.Errors.Select(e => e.Value));
    }
}
