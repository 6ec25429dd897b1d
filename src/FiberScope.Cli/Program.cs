using System.CommandLine;

return await new RootCommand("FiberScope: from micrographs of filter media to fibre diameters, solidity and a filtration forecast.").Parse(args).InvokeAsync();
