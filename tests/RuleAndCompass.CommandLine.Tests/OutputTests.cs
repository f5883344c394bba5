using RuleAndCompass.CommandLine.Files;
using UglyToad.PdfPig;

namespace RuleAndCompass.CommandLine.Tests;

public sealed class OutputTests
{
    private static readonly string[] Outputs = ["gable-cut.svg", "gable-full.pdf", "gable-report.json", "gable-report.txt", "gable-steps.pdf"];

    [Fact]
    public void A_making_leaves_its_outputs_in_the_folder_named()
    {
        using Workshop workshop = new();
        string script = workshop.Script("gable.setout", Workshop.Triangle);

        Ran ran = Workshop.Run("make", script, "-o", workshop.At("some/where"));

        ran.Status.ShouldBe(0, ran.Error);
        workshop.Files().ShouldBe(["gable.setout", .. Outputs.Select(name => $"some/where/{name}")]);
        using PdfDocument steps = PdfDocument.Open(workshop.At("some/where/gable-steps.pdf"));
        steps.NumberOfPages.ShouldBeGreaterThan(0);
        string.Concat(steps.GetPages().Select(page => page.Text)).ShouldContain("ridge");
    }

    [Fact]
    public void The_same_script_gives_the_same_bytes()
    {
        using Workshop workshop = new();
        string script = workshop.Script("gable.setout", Workshop.Triangle);

        Workshop.Run("make", script, "-o", workshop.At("first")).Status.ShouldBe(0);
        Workshop.Run("make", script, "-o", workshop.At("second")).Status.ShouldBe(0);

        foreach (string name in Outputs)
            File.ReadAllBytes(workshop.At($"second/{name}")).ShouldBe(File.ReadAllBytes(workshop.At($"first/{name}")), name);
    }

    [Fact]
    public void Each_output_tells_which_script_it_came_from()
    {
        using Workshop workshop = new();
        string script = workshop.Script("Grüner Giebel (2).setout", Workshop.Triangle);

        Workshop.Run("make", script, "-o", workshop.At("out")).Status.ShouldBe(0);

        foreach (string path in Directory.GetFiles(workshop.At("out")))
            OutputMark.Find(path).ShouldBe("Grüner Giebel (2).setout", path);
    }

    [Fact]
    public void An_output_is_replaced_by_its_own_script_alone_or_by_force()
    {
        using Workshop workshop = new();
        string gable = workshop.Script("gable.setout", Workshop.Triangle), barn = workshop.Script("barn.setout", Workshop.Triangle);
        string cut = workshop.At("cut.svg");
        Workshop.Run("plates", gable, "--only", "cut", "-o", cut).Status.ShouldBe(0);
        byte[] before = File.ReadAllBytes(cut);

        Workshop.Run("plates", gable, "--only", "cut", "-o", cut, "--given", "base=80 mm").Status.ShouldBe(0);
        File.ReadAllBytes(cut).ShouldNotBe(before);

        Ran refused = Workshop.Run("plates", barn, "--only", "cut", "-o", cut);
        refused.Status.ShouldBe(3);
        refused.Error.ShouldContain("was made from `gable.setout`  (RC6006)");
        OutputMark.Find(cut).ShouldBe("gable.setout");

        Workshop.Run("plates", barn, "--only", "cut", "-o", cut, "--force").Status.ShouldBe(0);
        OutputMark.Find(cut).ShouldBe("barn.setout");
    }

    [Fact]
    public void A_strange_file_in_the_way_of_one_output_stops_them_all()
    {
        using Workshop workshop = new();
        string script = workshop.Script("gable.setout", Workshop.Triangle);
        Directory.CreateDirectory(workshop.At("out"));
        File.WriteAllText(workshop.At("out/gable-report.txt"), "my own notes");

        Ran ran = Workshop.Run("make", script, "-o", workshop.At("out"));

        ran.Status.ShouldBe(3);
        ran.Error.ShouldContain("was not made by this program  (RC6006)");
        workshop.Files().ShouldBe(["gable.setout", "out/gable-report.txt"]);
        workshop.Read("out/gable-report.txt").ShouldBe("my own notes");
    }

    [Fact]
    public void A_write_that_fails_half_way_leaves_everything_as_it_was()
    {
        using Workshop workshop = new();
        string first = workshop.At("out/first.txt"), second = workshop.At("out/second.txt");
        Directory.CreateDirectory(workshop.At("out"));
        File.WriteAllText(first, "Set out from gable.setout by Rule and Compass, the older one");
        OutputFiles files = new("gable.setout", force: false) { Open = path => path.Contains("second", StringComparison.Ordinal) ? new FullDisk(path) : File.Create(path) };
        files.Add(first, "the newer one");
        files.Add(second, "one that does not fit on the disk");

        StopException stop = Should.Throw<StopException>(() => files.Write(CancellationToken.None));

        stop.Status.ShouldBe(3);
        stop.Finding.Code.ShouldBe("RC6005");
        stop.Finding.Message.ShouldContain("there is no room on the disk");
        workshop.Files().ShouldBe(["out/first.txt"]);
        File.ReadAllText(first).ShouldContain("the older one");
    }

    [Fact]
    public void A_write_that_fails_half_way_removes_the_folders_it_made()
    {
        using Workshop workshop = new();
        OutputFiles files = new("gable.setout", force: false) { Open = path => new FullDisk(path) };
        files.Add(workshop.At("new/folder/file.txt"), "one that does not fit on the disk");

        Should.Throw<StopException>(() => files.Write(CancellationToken.None));

        Directory.GetFileSystemEntries(workshop.Folder).ShouldBeEmpty();
    }

    [Fact]
    public void An_interruption_while_writing_leaves_everything_as_it_was()
    {
        using Workshop workshop = new();
        using CancellationTokenSource interrupt = new();
        OutputFiles files = new("gable.setout", force: false)
        {
            Open = path =>
            {
                interrupt.Cancel();
                return File.Create(path);
            },
        };
        files.Add(workshop.At("new/first.txt"), "first");
        files.Add(workshop.At("new/second.txt"), "second");

        Should.Throw<OperationCanceledException>(() => files.Write(interrupt.Token));

        Directory.GetFileSystemEntries(workshop.Folder).ShouldBeEmpty();
    }

    [Fact]
    public void A_given_is_set_from_the_command_line_and_told_in_the_report()
    {
        using Workshop workshop = new();
        string script = workshop.Script("gable.setout", Workshop.Triangle);

        Ran ran = Workshop.Run("report", script, "--given", "base=64 mm");

        ran.Status.ShouldBe(0, ran.Error);
        ran.Output.ShouldContain("base = 64 mm (in place of the script's own)");
        ran.Output.ShouldContain("64.0000 mm");
        ran.Output.ShouldContain("60°00.00′ = 60.00000°");
    }

    [Fact]
    public void Digits_are_as_many_as_are_asked_for()
    {
        using Workshop workshop = new();
        string script = workshop.Script("root.setout", "prick A at (0, 0)\nprick B at (10 mm, 10 mm)\ncompare distance A to B with 10 mm * sqrt(2)\n");

        // √2 to 30 digits: OEIS A002193
        Workshop.Run("report", script, "--digits", "30").Output.ShouldContain("14.1421356237309504880168872421 mm");
    }

    [Fact]
    public void A_script_is_read_from_standard_input()
    {
        Ran ran = Workshop.RunWith(Workshop.Triangle, CancellationToken.None, "check", "-");

        ran.Status.ShouldBe(0);
        ran.Output.ShouldStartWith("standard input: ");
        Workshop.RunWith("prick\n", CancellationToken.None, "check", "-").Error.ShouldStartWith("standard input, line 1: ");
    }

    [Fact]
    public void Used_scripts_are_looked_for_beside_the_script()
    {
        using Workshop workshop = new();
        Directory.CreateDirectory(workshop.At("gables"));
        workshop.Script("gables/parts.setout", "recipe \"tip\"\n  needs foot point\n  gives top\n  prick top at (0, 20 mm) from foot\nend\n");
        string script = workshop.Script("gables/main.setout", "use \"parts.setout\"\nprick A at (0, 0)\nfollow \"tip\" as x with foot = A\nclaim distance A to x.top = 20 mm\n");

        Ran ran = Workshop.Run("check", script);

        ran.Status.ShouldBe(0, ran.Error);
        ran.Output.ShouldContain("1 claim, it holds");
    }

    [Fact]
    public void A_saved_hand_is_read_from_its_file()
    {
        using Workshop workshop = new();
        string script = workshop.Script("gable.setout", Workshop.Triangle);
        File.WriteAllText(workshop.At("mine.hand"), "# Measured in spring.\nhand prick 0.07 mm,\n  edge 0.09 mm\n");

        Workshop.Run("report", script, "--hand", $"@{workshop.At("mine.hand")}").Output.ShouldContain("prick 0.07 mm, edge 0.09 mm");
        Workshop.Run("report", script, "--hand", $"@{workshop.At("gone.hand")}").Status.ShouldBe(3);
    }

    /// <summary>A disk with room for a few bytes.</summary>
    private sealed class FullDisk(string path) : Stream
    {
        private readonly FileStream file = File.Create(path);

        public override bool CanRead => false;

        public override bool CanSeek => false;

        public override bool CanWrite => true;

        public override long Length => file.Length;

        public override long Position { get => file.Position; set => throw new NotSupportedException(); }

        public override void Flush() => file.Flush();

        public override int Read(byte[] buffer, int offset, int count) => throw new NotSupportedException();

        public override long Seek(long offset, SeekOrigin origin) => throw new NotSupportedException();

        public override void SetLength(long value) => throw new NotSupportedException();

        public override void Write(byte[] buffer, int offset, int count)
        {
            file.Write(buffer, offset, Math.Min(count, 5));
            file.Flush();
            throw new IOException("No space left on device", 28);
        }

        protected override void Dispose(bool disposing)
        {
            file.Dispose();
            base.Dispose(disposing);
        }
    }
}
