using System.Collections.Immutable;
using FiberScope.Assessment.Input;
using FiberScope.Imaging;

namespace FiberScope.Assessment.Measuring;

/// <summary>The images of one layer, with how they were made.</summary>
/// <param name="Layer">The layer's name; empty for the only layer.</param>
/// <param name="Imaging">How the micrographs were made, where their group does not say otherwise.</param>
/// <param name="Groups">The image groups; at least one.</param>
/// <param name="Folder">The folder that relative paths start from.</param>
/// <param name="File">The file that names the images, for messages.</param>
public sealed record ImageSet(string Layer, ImagingMode Imaging, ImmutableArray<ImageGroup> Groups, string Folder, string File);
