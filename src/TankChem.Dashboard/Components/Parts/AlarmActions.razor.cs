using Microsoft.AspNetCore.Components;
using Microsoft.JSInterop;
using TankChem.Alarms;
using TankChem.Dashboard.Live;
using TankChem.Monitoring.Alarming;
using TankChem.Monitoring.Ports;

namespace TankChem.Dashboard.Components.Parts;

/// <summary>Acknowledges or shelves one alarm; the place's name is on every button.</summary>
public sealed partial class AlarmActions
{
    private AlarmAction? open;
    private string who = "";
    private string reason = "";
    private int minutes = 60;
    private bool sending;
    private OperationResult? fault;

    /// <summary>The alarm.</summary>
    [Parameter, EditorRequired]
    public required AlarmView Alarm { get; set; }

    /// <summary>Whether shelving is offered too.</summary>
    [Parameter]
    public bool ShowShelve { get; set; }

    /// <summary>Told when a form opens (true) or closes.</summary>
    [Parameter]
    public EventCallback<bool> OnOpen { get; set; }

    /// <summary>What people do.</summary>
    [Inject]
    public required IOperations Operations { get; set; }

    /// <summary>The live farm, for its clock.</summary>
    [Inject]
    public required IFarm Farm { get; set; }

    /// <summary>The browser.</summary>
    [Inject]
    public required IJSRuntime Browser { get; set; }

    private string Verb => open switch
    {
        AlarmAction.Shelve => "Shelve",
        AlarmAction.Unshelve => "Show again",
        _ => "Acknowledge",
    };

    private string? FaultOf(string field) => fault?.Field == field ? fault.Fault : null;

    private Task Open(AlarmAction action)
    {
        open = action;
        fault = null;
        return OnOpen.InvokeAsync(true);
    }

    private Task Close()
    {
        open = null;
        fault = null;
        return OnOpen.InvokeAsync(false);
    }

    private async Task SendAsync()
    {
        if (open is not { } action)
            return;
        sending = true;
        try
        {
            DateTimeOffset? until = action == AlarmAction.Shelve ? Farm.Now.AddMinutes(minutes) : null;
            OperationResult result = await Operations.CommandAlarmAsync(
                new AlarmCommand(Alarm.Key, action, who, string.IsNullOrWhiteSpace(reason) ? null : reason, until), CancellationToken.None);
            if (!result.Done)
            {
                fault = result;
                return;
            }

            await BrowserMemory.RememberNameAsync(Browser, who);
            reason = "";
            await Close();
        }
        finally
        {
            sending = false;
        }
    }
}
