using FiberScope.Assessment;
using FiberScope.Imaging.Masks;

namespace FiberScope.Cli.Output;

/// <summary>Writes the masks of measured fields: defects and traces, one picture each.</summary>
internal static class MaskFiles
{
    public static void Add(OutputBatch batch, IEnumerable<FieldFinding> fields, string folder)
    {
        var taken = new HashSet<string>(StringComparer.OrdinalIgnoreCase);
        foreach (var field in fields)
        {
            var name = Path.Combine(folder, Name(field, taken));
            batch.Add(name + ".defects.png", stream => FieldMask.WriteDefects(field.Measurement, stream));
            batch.Add(name + ".traces.png", stream => FieldMask.WriteTraces(field.Measurement, stream));
        }
    }

    /// <summary>The image's own name; where two images share it, the field's number makes the difference.</summary>
    private static string Name(FieldFinding field, HashSet<string> taken)
    {
        var page = field.Name.LastIndexOf('#');
        var (file, suffix) = page < 0 ? (field.Name, "") : (field.Name[..page], "-" + field.Name[(page + 1)..]);
        var name = Path.GetFileNameWithoutExtension(file) + suffix;
        return taken.Add(name) ? name : FormattableString.Invariant($"{name}-{field.Number}");
    }
}
