using System.CommandLine;
using FiberScope.Validation.Filtration;
using FiberScope.Validation.Imaging;
using FiberScope.Validation.Samples;
using FiberScope.Validation.Structure;

var root = new RootCommand("Measures FiberScope against outside references and writes what it finds to docs/validation.md.")
{
    FiltrationCommand.Create(),
    ImagingCommand.Create(),
    SamplesCommand.Create(),
    StructureCommand.Create(),
};

return root.Parse(args).Invoke();
