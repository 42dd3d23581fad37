using TankChem.Service.CommandLine;

return await Cli.RunAsync(args, Console.Out, Console.Error);
