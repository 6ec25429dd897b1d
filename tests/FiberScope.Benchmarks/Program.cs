using BenchmarkDotNet.Running;

BenchmarkSwitcher.FromAssembly(typeof(FiberScope.Benchmarks.ForecastBenchmark).Assembly).Run(args);
return 0;
