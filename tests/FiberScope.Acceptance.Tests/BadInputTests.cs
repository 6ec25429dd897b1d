using FiberScope.Cli;

namespace FiberScope.Acceptance.Tests;

public sealed class BadInputTests(SmallFields fields) : IClassFixture<SmallFields>
{
    private const string Good = """
        images:
          - files: IMAGES
            pixel_size: 200 nm
        basis_weight: 25 g/m2
        thickness: 310 um
        polymer: pp
        face_velocity: 5.3 cm/s
        """;

    [Theory]
    [InlineData("pixel_size: 200 nm", "pixel_size: 0 nm", "above zero")]
    [InlineData("pixel_size: 200 nm", "pixel_size: -200 nm", "above zero")]
    [InlineData("pixel_size: 200 nm", "pixel_size: 24.8", "no unit")]
    [InlineData("pixel_size: 200 nm", "pixel_size: 24.8 kg", "a length is wanted")]
    [InlineData("thickness: 310 um", "note: none", "needs 'thickness'")]
    [InlineData("thickness: 310 um", "thickness: 2 um", "below 1")]
    [InlineData("basis_weight: 25 g/m2", "solidity: 1", "between 0 and 1")]
    [InlineData("polymer: pp", "polymer: pp\nthicknes: 3 um", "did you mean 'thickness'?")]
    [InlineData("polymer: pp", "polymer: [pp", "not valid YAML")]
    [InlineData("face_velocity: 5.3 cm/s", "face_velocity: 0 cm/s", "above zero")]
    [InlineData("polymer: pp", "polymer: pp\ngrade: nowhere.yaml", "no such file")]
    public Task A_mistake_in_the_swatch_file_is_told_in_one_line(string right, string wrong, string told) =>
        Refused(Good.Replace(right, wrong, StringComparison.Ordinal), fields.Field(1), told);

    [Fact]
    public Task A_missing_image_is_told_in_one_line() => Refused(Good, "nowhere.tif", "no such image");

    [Fact]
    public Task A_glob_without_images_is_told_in_one_line() => Refused(Good, "nowhere/*.tif", "no image matches");

    [Fact]
    public Task A_file_that_is_no_image_is_told_in_one_line() => RefusedImage("not an image"u8.ToArray(), "not an image");

    [Fact]
    public Task An_empty_file_is_told_in_one_line() => RefusedImage([], "empty");

    [Fact]
    public Task A_picture_of_one_pixel_is_told_in_one_line() => RefusedImage(Bitmaps.Flat(1, 1, 128), "image");

    [Fact]
    public Task An_all_black_picture_is_told_in_one_line() => RefusedImage(Bitmaps.Flat(400, 300, 0), "image");

    [Fact]
    public async Task A_truncated_picture_is_told_in_one_line()
    {
        var whole = await File.ReadAllBytesAsync(fields.Field(1), TestContext.Current.CancellationToken);
        await RefusedImage(whole[..(whole.Length / 2)], "image");
    }

    [Fact]
    public async Task A_truncated_TIFF_is_told_in_one_line()
    {
        using var workspace = new Workspace();
        var made = await CommandRun.OfAsync("specimen", "md-oriented", "--format", "tiff", "--out", workspace.PathTo("tiff"), "--figures-only");
        Assert.Equal(ExitCode.Done, made.Code);
        var whole = await File.ReadAllBytesAsync(workspace.PathTo("tiff", "field-01.tif"), TestContext.Current.CancellationToken);
        await RefusedImage(whole[..(whole.Length / 3)], "image");
    }

    [Fact]
    public async Task No_pixel_size_anywhere_names_the_ways_to_give_it()
    {
        using var workspace = new Workspace();
        var image = workspace.Write("plain.bmp", Bitmaps.Flat(400, 300, 90));
        var run = await CommandRun.OfAsync("measure", image, "--json", workspace.PathTo("out.json"));
        Assert.Equal(ExitCode.BadInput, run.Code);
        Assert.Contains("pixel", Assert.Single(run.ErrorLines), StringComparison.OrdinalIgnoreCase);
    }

    [Fact]
    public async Task A_folder_that_cannot_be_written_has_its_own_code()
    {
        using var workspace = new Workspace();
        var file = workspace.Write("file", "not a folder");
        var swatch = workspace.Write("swatch.yaml", Good.Replace("IMAGES", fields.Field(1), StringComparison.Ordinal));
        var run = await CommandRun.OfAsync("assess", swatch, "--out", Path.Combine(file, "inside"));
        Assert.Equal(ExitCode.NotWritable, run.Code);
        Assert.Single(run.ErrorLines);
    }

    [Fact]
    public async Task A_missing_swatch_file_is_told_in_one_line()
    {
        var run = await CommandRun.OfAsync("assess", "nowhere.yaml");
        Assert.Equal((ExitCode.BadInput, "nowhere.yaml: no such file"), (run.Code, Assert.Single(run.ErrorLines)));
    }

    [Fact]
    public async Task A_wrong_option_is_bad_input_too()
    {
        var run = await CommandRun.OfAsync("assess", "swatch.yaml", "--nothing");
        Assert.Equal(ExitCode.BadInput, run.Code);
    }

    [Fact]
    public async Task A_pixel_size_on_the_command_line_needs_its_unit()
    {
        var run = await CommandRun.OfAsync("measure", fields.Field(1), "--pixel-size", "24.8", "--json", "-");
        Assert.Equal(ExitCode.BadInput, run.Code);
        Assert.Contains("--pixel-size: '24.8' has no unit", Assert.Single(run.ErrorLines), StringComparison.Ordinal);
        Assert.True(run.Output.IsEmpty);
    }

    [Fact]
    public async Task Stopping_writes_nothing()
    {
        using var workspace = new Workspace();
        using var stopped = new CancellationTokenSource();
        await stopped.CancelAsync();
        var swatch = workspace.Write("swatch.yaml", Good.Replace("IMAGES", fields.Field(1), StringComparison.Ordinal));
        var before = workspace.Everything();
        var run = await CommandRun.OfAsync([], stopped.Token, "assess", swatch);
        Assert.Equal(ExitCode.Cancelled, run.Code);
        Assert.Equal(before, workspace.Everything());
    }

    private static async Task RefusedImage(byte[] bytes, string told)
    {
        using var elsewhere = new Workspace();
        await Refused(Good, elsewhere.Write("bad-image.tif", bytes), told);
    }

    private static async Task Refused(string swatch, string image, string told)
    {
        using var workspace = new Workspace();
        var path = workspace.Write("swatch.yaml", swatch.Replace("IMAGES", image, StringComparison.Ordinal));
        var before = workspace.Everything();
        var run = await CommandRun.OfAsync("assess", path);
        Assert.Equal(ExitCode.BadInput, run.Code);
        Assert.Contains(told, Assert.Single(run.ErrorLines), StringComparison.Ordinal);
        Assert.Empty(run.Out);
        Assert.Equal(before, workspace.Everything());
    }
}
