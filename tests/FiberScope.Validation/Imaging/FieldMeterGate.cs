using System.Reflection;
using FiberScope.Imaging;

namespace FiberScope.Validation.Imaging;

/// <summary>Calls the measurement by name, so that this program builds before it exists.</summary>
internal static class FieldMeterGate
{
    public static FieldMeasurement Measure(Micrograph picture)
    {
        var method = typeof(Micrograph).Assembly.GetType("FiberScope.Imaging.FieldMeter")?.GetMethod("Measure", BindingFlags.Public | BindingFlags.Static)
            ?? throw new NotSupportedException("FieldMeter.Measure is not there yet: run with --quick.");
        var settings = Activator.CreateInstance(method.GetParameters()[1].ParameterType);
        return (FieldMeasurement)method.Invoke(null, [picture, settings, CancellationToken.None])!;
    }
}
