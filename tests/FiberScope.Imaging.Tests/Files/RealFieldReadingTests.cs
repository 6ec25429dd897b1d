using FiberScope.Imaging.Files;

namespace FiberScope.Imaging.Tests.Files;

/// <summary>Real micrographs, where a folder of them lies beside the project; skipped elsewhere.</summary>
public sealed class RealFieldReadingTests
{
    [Fact]
    public void Real_fields_are_read_and_show_no_strip()
    {
        var files = RealFields.Files();
        Assert.SkipWhen(files.Length == 0, "No folder of real micrographs here.");
        foreach (var file in files)
        {
            var micrograph = Assert.Single(MicrographReader.Read(file, new ScaleRequest { PixelSize = UnitsNet.Length.FromMicrometers(1) }, ImagingMode.SecondaryElectron));
            Assert.Equal((Path.GetFileName(file), 0), (Path.GetFileName(file), micrograph.ExcludedBottomRows));
        }
    }

    [Fact]
    public void Their_printing_resolution_is_no_scale()
    {
        var files = RealFields.Files();
        Assert.SkipWhen(files.Length == 0, "No folder of real micrographs here.");
        foreach (var file in files)
        {
            Assert.Throws<ImageRejectedException>(() => MicrographReader.Read(file, ScaleRequest.FromFile, ImagingMode.SecondaryElectron));
        }
    }
}
