using System.CommandLine;
using TankChem.Monitoring.Configuration;
using TankChem.Service.Hosting;
using TankChem.Service.Solve;

namespace TankChem.Service.CommandLine;

/// <summary>The command line: <c>demo</c>, <c>run</c>, <c>solve</c>, <c>check-config</c>.</summary>
internal static class Cli
{
    public static async Task<int> RunAsync(string[] args, TextWriter output, TextWriter error)
    {
        RootCommand root = Build(output, error);
        ParseResult parsed = root.Parse(args);
        if (parsed.Errors.Count > 0)
        {
            foreach (var fault in parsed.Errors)
                await error.WriteLineAsync(fault.Message);
            await error.WriteLineAsync("tankchem --help lists the verbs, tankchem VERB --help their options.");
            return ExitCode.WrongUse;
        }

        try
        {
            return await parsed.InvokeAsync(new InvocationConfiguration { EnableDefaultExceptionHandler = false, Output = output, Error = error });
        }
        catch (UsageException e)
        {
            foreach (string line in e.Lines)
                await error.WriteLineAsync(line);
            return ExitCode.WrongUse;
        }
        catch (RunFailedException e)
        {
            await error.WriteLineAsync(e.Message);
            return ExitCode.Failed;
        }
        catch (OperationCanceledException)
        {
            return ExitCode.Done;
        }
#pragma warning disable CA1031 // The last resort: one line for the person at the terminal instead of a stack trace.
        catch (Exception e)
#pragma warning restore CA1031
        {
            await error.WriteLineAsync($"tankchem failed: {e.GetType().Name}: {e.Message.ReplaceLineEndings(" ")}");
            return ExitCode.Failed;
        }
    }

    private static RootCommand Build(TextWriter output, TextWriter error)
    {
        var root = new RootCommand("TankChem watches CO2, pH and alkalinity where animals live: readings in over MQTT, water states, alarms and dosing advice out.");
        root.Subcommands.Add(Demo());
        root.Subcommands.Add(Run());
        root.Subcommands.Add(Solve(error));
        root.Subcommands.Add(CheckConfig(output, error));
        return root;
    }

    private static Option<DirectoryInfo?> DataOption(string fallback) => new("--data") { Description = $"Folder for everything the service writes (default: {fallback}).", HelpName = "DIR" };

    private static Option<string?> HttpOption() => new("--http") { Description = "Address of dashboard and HTTP API, loopback only (default: http://127.0.0.1:5080).", HelpName = "URL" };

    private static Option<int?> MqttPortOption()
    {
        var option = new Option<int?>("--mqtt-port") { Description = "Port of the embedded broker (default: 1883).", HelpName = "N" };
        option.Validators.Add(result =>
        {
            if (result.GetValueOrDefault<int?>() is < 0 or > 65535)
                result.AddError("--mqtt-port must be 1 to 65535 (0 lets the system choose).");
        });
        return option;
    }

    private static Command Demo()
    {
        Option<DirectoryInfo?> data = DataOption("./tankchem-data");
        Option<string?> http = HttpOption();
        Option<int?> mqttPort = MqttPortOption();
        var command = new Command("demo", "Runs the main job on an invented site: embedded broker, store, simulated water over real MQTT, dashboard.") { data, http, mqttPort };
        command.SetAction((parsed, cancel) => ServiceHost.RunAsync(
            ServiceSettings.ForDemo(parsed.GetValue(data)?.FullName, parsed.GetValue(http), parsed.GetValue(mqttPort)), cancel));
        return command;
    }

    private static Command Run()
    {
        var config = new Option<FileInfo?>("--config") { Description = "Configuration file (JSON, comments allowed); without one the service starts empty and shows what publishes.", HelpName = "FILE" };
        Option<DirectoryInfo?> data = DataOption("the platform's usual place for service state");
        Option<string?> http = HttpOption();
        Option<int?> mqttPort = MqttPortOption();
        var command = new Command("run", "Runs the service.") { config, data, http, mqttPort };
        command.SetAction((parsed, cancel) => ServiceHost.RunAsync(
            ServiceSettings.ForRun(parsed.GetValue(config), parsed.GetValue(data)?.FullName, parsed.GetValue(http), parsed.GetValue(mqttPort)), cancel));
        return command;
    }

    private static Command Solve(TextWriter error)
    {
        var input = new Option<string>("--input") { Description = "CSV to read; - for standard input.", Required = true, HelpName = "FILE.csv" };
        var output = new Option<string>("--output") { Description = "CSV to write; - for standard output.", Required = true, HelpName = "FILE.csv" };
        var command = new Command("solve", "Solves the carbonate system of every row of a CSV file.") { input, output };
        command.SetAction(parsed => SolveCommand.Run(parsed.GetValue(input)!, parsed.GetValue(output)!, error));
        return command;
    }

    private static Command CheckConfig(TextWriter output, TextWriter error)
    {
        var file = new Argument<FileInfo>("FILE") { Description = "The configuration file." };
        var command = new Command("check-config", "Checks a configuration: every fault at once, each with its path.") { file };
        command.SetAction(parsed =>
        {
            ConfigurationResult result = ServiceSettings.ReadConfiguration(parsed.GetValue(file)!);
            foreach (ConfigurationNote warning in result.Warnings)
                error.WriteLine($"warning: {warning.Path}: {warning.Text}");
            foreach (ConfigurationNote fault in result.Faults)
                error.WriteLine($"{fault.Path}: {fault.Text}");
            if (result.Faults.Count > 0)
                return ExitCode.WrongUse;
            output.WriteLine(result.Warnings.Count == 0 ? "The configuration is valid." : $"The configuration is valid, with {result.Warnings.Count} warning(s).");
            return ExitCode.Done;
        });
        return command;
    }
}
