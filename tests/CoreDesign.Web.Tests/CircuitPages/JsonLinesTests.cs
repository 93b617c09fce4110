using CoreDesign.Web.Features.Circuits;

namespace CoreDesign.Web.Tests.CircuitPages;

public sealed class JsonLinesTests
{
    private const string Text = """
        {
          "frequency": 50,
          "supply": { "connection": "Y",
                      "V": 1 },
          "materials": { "steel no. 1": {
              "stops": [ { "r": 1, "w": 2 },
                         { "r": 3, "w": 4 } ] } },
          "branches": [
            { "name": "a" },
            7, [ 1 ],
            { "name": "b",
              "area": 0 }
          ]
        }
        """;

    [Theory]
    [InlineData("$", 1)]
    [InlineData("frequency", 2)]
    [InlineData("supply", 3)]
    [InlineData("supply.V", 4)]
    [InlineData("materials.steel no. 1", 5)]
    [InlineData("materials.steel no. 1.stops", 6)]
    [InlineData("materials.steel no. 1.stops[1]", 7)]
    [InlineData("materials.steel no. 1.stops[1].w", 7)]
    [InlineData("branches[0].name", 9)]
    [InlineData("branches[1]", 10)]
    [InlineData("branches[2][0]", 10)]
    [InlineData("branches[3]", 11)]
    [InlineData("branches[3].area", 12)]
    public void Value_is_found_on_its_line(string path, int line) => Assert.Equal(line, JsonLines.Of(Text, [path])[path]);

    [Theory]
    [InlineData("branches[0].area", 9)]
    [InlineData("branches[3].length", 11)]
    [InlineData("branches[9].name", 8)]
    [InlineData("windings", 1)]
    [InlineData("windings[0].coils[2].turns", 1)]
    [InlineData("materials.other.B", 5)]
    public void What_is_missing_is_looked_for_where_it_should_be(string path, int line) => Assert.Equal(line, JsonLines.Of(Text, [path])[path]);

    [Fact]
    public void All_paths_are_found_in_one_go()
    {
        var lines = JsonLines.Of(Text, ["branches[3].area", "supply.V", "supply.V", "windings"]);

        Assert.Equal([("branches[3].area", 12), ("supply.V", 4), ("windings", 1)], lines.Select(l => (l.Key, l.Value)));
    }

    [Theory]
    [InlineData("{\n\"a\": 1,\n\"b\": NaN\n}", 3)]
    [InlineData("{\n\"a\": 1,\n", 3)]
    [InlineData("{\r\n\"a\": \"\0\"}", 2)]
    [InlineData("", 1)]
    public void Text_that_is_no_json_is_blamed_where_it_stops_being_json(string text, int line) => Assert.Equal(line, JsonLines.Of(text, ["$"])["$"]);

    [Fact]
    public void Hostile_names_are_passed_over()
    {
        var text = $"{{ \"\\ud800\": [1],\n \"{new string('x', 100_000)}\": [{string.Join(',', Enumerable.Repeat("[1]", 10_000))}],\n \"a.b[0]\": 2,\n \"windings\": [] }}";

        Assert.Equal(4, JsonLines.Of(text, ["windings"])["windings"]);
        Assert.Equal(3, JsonLines.Of(text, ["a.b[0]"])["a.b[0]"]);
    }

    [Fact]
    public void Nesting_deeper_than_is_read_is_blamed_on_its_line()
    {
        var text = "\n" + new string('[', 100_000);

        Assert.Equal(2, JsonLines.Of(text, ["$"])["$"]);
    }
}
