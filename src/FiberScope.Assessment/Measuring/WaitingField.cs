using FiberScope.Assessment.Input;
using FiberScope.Imaging;
using UnitsNet;

namespace FiberScope.Assessment.Measuring;

/// <summary>A picture waiting to be measured: where it belongs and what was told about its scale.</summary>
internal sealed record WaitingField(int Set, string Name, Micrograph Micrograph, Stated<Length>? PixelSize);
