// Each test starts real processes and promises times: side by side on a small machine they would only measure each other.
[assembly: Xunit.v3.Parallelization(Mode = Xunit.Sdk.ParallelMode.None)]
