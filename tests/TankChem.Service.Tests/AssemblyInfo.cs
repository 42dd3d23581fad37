// Some tests start real processes: side by side on a small machine they would only wait for each other.
[assembly: Xunit.v3.Parallelization(Mode = Xunit.Sdk.ParallelMode.None)]
