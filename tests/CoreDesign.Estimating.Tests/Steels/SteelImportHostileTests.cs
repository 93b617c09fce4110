using System.Text;
using CoreDesign.Estimating.Steels.Import;

namespace CoreDesign.Estimating.Tests.Steels;

public sealed class SteelImportHostileTests
{
    private static readonly string Good = SteelImport.Template;

    private static string OnlyError(SteelImportPreview preview)
    {
        Assert.False(preview.Ok);
        return Assert.Single(preview.Errors).Message;
    }

    [Fact]
    public async Task Ten_megabytes_are_refused_without_being_read_whole()
    {
        using var stream = new CountingStream(10 * 1024 * 1024);
        var preview = await SteelImport.ReadAsync(stream, "big.csv", TestContext.Current.CancellationToken);
        Assert.Equal("The file has more than 2097152 bytes; a certificate needs a few hundred lines. Leave other data out.", OnlyError(preview));
        Assert.Equal(SteelImport.MaxBytes + 1, stream.Position);
        Assert.Equal("The text has more than 2097152 characters; a certificate needs a few hundred lines. Leave other data out.", OnlyError(SteelImport.Read(new string('x', 10_000_000), null)));
    }

    [Fact]
    public async Task Stream_gives_what_its_bytes_give()
    {
        using var stream = new MemoryStream(Encoding.UTF8.GetBytes(Good));
        Assert.True((await SteelImport.ReadAsync(stream, null, TestContext.Current.CancellationToken)).Ok);
    }

    [Fact]
    public void Binary_content_is_refused_by_kind()
    {
        const string Workbook = "The file is a workbook, archive or PDF, not text; save the table as CSV and import that.";
        Assert.Equal(Workbook, OnlyError(SteelImport.Read("PK\u0003\u0004"u8, "a.xlsx")));
        Assert.Equal(Workbook, OnlyError(SteelImport.Read("%PDF-1.7"u8, null)));
        Assert.Equal(
            "Line 2: the file holds the control character U+0000, so it is binary or in an encoding without its mark; save it as CSV, UTF-8.",
            OnlyError(SteelImport.Read("name,x\nsou\0rce,y"u8, null)));
        Assert.Equal(
            "Line 1: the file holds the control character U+0000, so it is binary or in an encoding without its mark; save it as CSV, UTF-8.",
            OnlyError(SteelImport.Read(Encoding.Unicode.GetBytes(Good), null)));
        Assert.Equal(
            "Line 1: the file holds the control character U+0000, so it is binary or in an encoding without its mark; save it as CSV, UTF-8.",
            OnlyError(SteelImport.Read([.. Encoding.UTF32.GetPreamble(), .. Encoding.UTF32.GetBytes(Good)], null)));
        Assert.Equal("The file is empty; start from the template.", OnlyError(SteelImport.Read(""u8, null)));
        Assert.Equal("The file is empty; start from the template.", OnlyError(SteelImport.Read(" \r\n\t"u8, null)));
    }

    [Fact]
    public void Random_bytes_never_throw()
    {
        var random = new Random(1);
        for (var i = 0; i < 300; i++)
        {
            var bytes = new byte[random.Next(1, 400)];
            random.NextBytes(bytes);
            var preview = SteelImport.Read(bytes, null);
            Assert.False(preview.Ok);
            Assert.NotEmpty(preview.Errors);
        }
    }

    [Fact]
    public void Damaged_templates_never_throw_and_never_pass_with_errors()
    {
        var random = new Random(2);
        const string Pool = "\",;\t\n.-+eE019NaN#kH<";
        for (var i = 0; i < 500; i++)
        {
            var text = new StringBuilder(Good);
            for (var k = random.Next(1, 6); k > 0; k--)
            {
                text[random.Next(text.Length)] = Pool[random.Next(Pool.Length)];
            }

            var preview = SteelImport.Read(text.ToString(), null);
            Assert.Equal(preview.Ok, preview.Errors.Count == 0);
        }
    }

    [Fact]
    public void Page_of_markup_is_no_table()
    {
        Assert.Equal(
            "The file has no header row of a table; it needs a row with the columns kind, frequency_Hz, B_T, value, separated by comma, semicolon or tab.",
            OnlyError(SteelImport.Read("<html><body><script>alert(1)</script></body></html>"u8, "x.html")));
    }

    [Fact]
    public void Markup_in_a_name_stays_plain_text()
    {
        const string Name = "<script>alert('x')</script> & \"Co\"";
        var preview = SteelImport.Read(Good.Replace("Example steel coil 0001", "\"" + Name.Replace("\"", "\"\"", StringComparison.Ordinal) + "\"", StringComparison.Ordinal), "../../<b>.csv");
        Assert.Equal(Name, preview.Grade!.Name);
        Assert.Equal("Certificate number and date (file <b>.csv)", preview.Grade.Rolling.Source);
    }

    [Fact]
    public void Name_longer_than_eighty_characters_is_cut_in_the_message_only()
    {
        var preview = SteelImport.Read(Good.Replace("Example steel coil 0001", new string('n', 81), StringComparison.Ordinal), null);
        Assert.Equal($"Line 6, name: \"{new string('n', 40)}…\" has 81 characters; shorten it to 80 at most.", OnlyError(preview));
    }

    [Fact]
    public void Line_break_in_quotes_is_named_and_later_lines_keep_their_numbers()
    {
        var text = Good
            .Replace("Example steel coil 0001", "\"Example\r\nsteel\"", StringComparison.Ordinal)
            .Replace("loss,50,1,0.335", "loss,50,1,x", StringComparison.Ordinal);
        var preview = SteelImport.Read(text, null);
        Assert.Contains(
            "Line 6: the row has a line break within quotation marks; keep each cell on one line, and double a quotation mark that belongs to the text.",
            preview.Errors.Select(e => e.Message));
        var line = text.ReplaceLineEndings("\n").Split('\n').ToList().FindIndex(l => l == "loss,50,1,x") + 1;
        Assert.Contains(line, preview.Errors.Select(e => e.Line ?? 0));
    }

    [Fact]
    public void Quotation_mark_that_is_never_closed_is_named()
    {
        var preview = SteelImport.Read(Good.Replace("loss,60,0.5", "\"loss,60,0.5", StringComparison.Ordinal), null);
        Assert.False(preview.Ok);
        Assert.Contains(preview.Errors, e => e.Message.Contains("quotation mark", StringComparison.Ordinal) && e.Line == 32);
    }

    [Fact]
    public void Hundred_thousand_bad_rows_give_fifty_messages_and_a_count()
    {
        var text = Good + string.Concat(Enumerable.Repeat("loss,50,1,x\r\n", 100_000));
        var preview = SteelImport.Read(text, null);
        Assert.Equal(51, preview.Errors.Count);
        Assert.Equal("And 99950 more errors.", preview.Errors[^1].Message);
    }

    [Fact]
    public void Thousands_of_points_are_too_many()
    {
        var rows = Enumerable.Range(1, 2000).Select(i => FormattableString.Invariant($"loss,400,{i / 1000.0:0.000},{i / 20.0:0.000}\r\n"));
        var preview = SteelImport.Read(Good + string.Concat(rows), null);
        Assert.Contains("loss at 400 Hz: has 2000 points; at most 500 are taken. Thin the table out.", preview.Errors.Select(e => e.Message));
        var many = Enumerable.Range(20, 300).Select(i => $"excitingPower,{i},1.6,1.9\r\n");
        Assert.Contains(
            "excitingPower: has 300 frequencies; at most 10 are taken. Leave some out.",
            SteelImport.Read(Good + string.Concat(many), null).Errors.Select(e => e.Message));
    }

    [Fact]
    public void Control_characters_in_a_value_are_shown_as_dots()
    {
        var preview = SteelImport.Read(Good.Replace("Example steel coil 0001", "a\u0085b", StringComparison.Ordinal), null);
        Assert.Equal(
            "Line 6: the file holds the control character U+0085, so it is binary or in an encoding without its mark; save it as CSV, UTF-8.",
            OnlyError(preview));
    }

    /// <summary>As many bytes as asked for, counting how many were taken.</summary>
    private sealed class CountingStream(long length) : Stream
    {
        public override bool CanRead => true;

        public override bool CanSeek => false;

        public override bool CanWrite => false;

        public override long Length => length;

        public override long Position { get; set; }

        public override int Read(byte[] buffer, int offset, int count)
        {
            var taken = (int)Math.Min(count, length - Position);
            Array.Fill(buffer, (byte)'a', offset, taken);
            Position += taken;
            return taken;
        }

        public override void Flush() => throw new NotSupportedException();

        public override long Seek(long offset, SeekOrigin origin) => throw new NotSupportedException();

        public override void SetLength(long value) => throw new NotSupportedException();

        public override void Write(byte[] buffer, int offset, int count) => throw new NotSupportedException();
    }
}
