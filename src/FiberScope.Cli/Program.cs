using FiberScope.Cli;
using FiberScope.Cli.Console;

return await FiberScopeProgram.RunAsync(args, CommandConsole.OfProcess(), TimeProvider.System, CancellationToken.None);
