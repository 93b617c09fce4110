using System.Text;
using CoreDesign.Estimating.Contracts;

namespace CoreDesign.Estimating.Tests.Contracts;

public sealed class DesignJsonTests
{
    [Theory]
    [InlineData("""{"core":{"windowHeigth_mm":520}}""", "core.windowHeigth_mm", "Did you mean 'windowHeight_mm'?")]
    [InlineData("""{"colour":"red"}""", "colour", "Known members: order, excitedWinding, otherWinding, tertiary, capacitance, steel, core, joint, model, margins.")]
    [InlineData("""{"core":{"windowHeight_mm":"520"}}""", "core.windowHeight_mm", "\"520\" is given where a JSON number is needed")]
    [InlineData("""{"core":{"windowHeight_mm":1e999}}""", "core.windowHeight_mm", "1e999 is too large")]
    [InlineData("""{"core":{"windowHeight_mm":[1]}}""", "core.windowHeight_mm", "A list is given")]
    [InlineData("""{"core":{"limbSteps":[{"width_mm":1},{"width_mm":true}]}}""", "core.limbSteps[1].width_mm", "true is given")]
    [InlineData("""{"core":{"limbSteps":[null]}}""", "core.limbSteps[0]", "null is given")]
    [InlineData("""{"core":{"limbSteps":{}}}""", "core.limbSteps", "An object is given where a list")]
    [InlineData("""{"core":5}""", "core", "5 is given where an object with the members form")]
    [InlineData("""{"order":{"phases":2.5}}""", "order.phases", "2.5 is given where a whole number is needed")]
    [InlineData("""{"order":{"phases":99999999999}}""", "order.phases", "99999999999 is given where a whole number is needed")]
    [InlineData("""{"order":{"reference":7}}""", "order.reference", "7 is given where a text in quotes is needed")]
    [InlineData("""{"order":{"reference":"\ud800"}}""", "order.reference", "half of a surrogate pair")]
    [InlineData("""{"\ud800":1}""", "$", "half of a surrogate pair")]
    [InlineData("""{"order":{},"order":{}}""", "order", "given twice")]
    [InlineData("""{"Order":{}}""", "Order", "Did you mean 'order'?")]
    [InlineData("null", "$", "null is given")]
    [InlineData("[]", "$", "A list is given where an object")]
    [InlineData("", "$", "The body is empty")]
    [InlineData("{\"order\":\n {\"phases\": NaN}}", "$", "near line 2, byte 13")]
    [InlineData("""{"order":{},}""", "$", "no trailing commas")]
    [InlineData("""{"order":{}""", "$", "not JSON")]
    public void Json_that_does_not_fit_is_refused_with_path_and_mend(string json, string path, string message)
    {
        var error = Assert.Single(DesignJson.Read<DesignInput>(json).Errors);

        Assert.Equal(path, error.Path);
        Assert.Contains(message, error.Message, StringComparison.Ordinal);
        Assert.DoesNotContain("System.", error.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Every_misfit_is_reported_at_once()
    {
        var read = DesignJson.Read<DesignInput>("""{"order":{"phases":"3","rating":5},"steal":{},"core":{"windowWidth_mm":false}}""");

        Assert.Null(read.Value);
        Assert.Equal(["order.phases", "order.rating", "steal", "core.windowWidth_mm"], read.Errors.Select(e => e.Path));
    }

    [Fact]
    public void Nesting_beyond_the_limit_is_refused_without_a_crash()
    {
        var deep = string.Concat(Enumerable.Repeat("{\"core\":", 10_000)) + "1" + new string('}', 10_000);

        Assert.Contains("At most 32 levels", Assert.Single(DesignJson.Read<DesignInput>(deep).Errors).Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Bytes_that_are_not_utf8_are_refused()
    {
        var latin1 = Encoding.Latin1.GetBytes("""{"order":{"reference":"Größe"}}""");

        Assert.Contains("UTF-8", Assert.Single(DesignJson.Read<DesignInput>(latin1).Errors).Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Contract_sample_reads_whole_and_writes_back_under_the_same_names()
    {
        const string Sample = """{"order":{"reference":"HR-1042","phases":3,"ratedPower_kVA":1000,"frequency_Hz":50,"highestVoltage_percent":110,"askedNoLoadLoss_W":693,"askedNoLoadCurrent_percent":0.5},"excitedWinding":{"connection":"YN","lineVoltage_V":400,"turns":18,"resistance_ohm":0},"steel":{"grade":"M105-30P"},"core":{"form":"threeLimb","limbSteps":[{"width_mm":210,"stack_mm":62.5}],"yoke":{"areaFactor":1},"windowHeight_mm":520,"windowWidth_mm":190,"stackingFactor":0.965},"joint":{"type":"stepLap","positions":5,"sheetsPerPosition":1,"gap_mm":0.3,"overlap_mm":4},"model":{"buildingFactor":1,"temperature_C":20}}""";

        var read = DesignJson.Read<DesignInput>("\uFEFF" + Sample);

        Assert.Empty(read.Errors);
        Assert.Equal(Sample, DesignJson.Write(read.Value));
    }

    [Theory]
    [InlineData("windowHeigth_mm", "windowHeight_mm")]
    [InlineData("WINDOWHEIGHT_MM", "windowHeight_mm")]
    [InlineData("zzzzzzzzzzzzzzz", null)]
    [InlineData("", null)]
    public void Nearest_name_is_found_only_within_reach(string name, string? expected) =>
        Assert.Equal(expected, NearestName.Of(name, ["windowHeight_mm", "windowWidth_mm", "stackingFactor"], count: 1).SingleOrDefault());
}
