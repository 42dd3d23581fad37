using TankChem.Benchmarks;

Console.WriteLine($"{"job",-52} {"µs",10} {"bare µs",10} {"ratio",8}");
SolveComparison.Print();
StoreComparison.Print();
