using Microsoft.AspNetCore.Components;
using TankChem.Dashboard.Text;
using TankChem.Dosing;
using TankChem.Monitoring.Advising;
using TankChem.Monitoring.Alarming;
using TankChem.Monitoring.Ports;
using TankChem.Monitoring.Readings;
using TankChem.Monitoring.Water;

namespace TankChem.Dashboard.Components.Parts;

/// <summary>What to do: remedies first, then dose plans.</summary>
public sealed partial class ActView
{
    private string targetText = "";
    private string unit = "mmol/L";
    private string reagent = "";
    private string? targetFault;
    private DosePlan? plan;

    /// <summary>The place.</summary>
    [Parameter, EditorRequired]
    public required PlaceSnapshot Place { get; set; }

    /// <summary>Plans and remedies.</summary>
    [Inject]
    public required IOperations Operations { get; set; }

    /// <summary>CO2 is over a limit, or an alarm about CO2 or low pH stands.</summary>
    private bool CarbonWorry =>
        Place.Alarms.Any(a => a.IsActive && AlarmAdvice.Of(a) == AdviceSection.HighCo2)
        || (Place.Water.Values.TryGetValue("co2", out WaterValue? co2) && Place.Limits.Any(l => l.Quantity == "co2" && l.IsUpper && co2.Value + (co2.U ?? 0) > l.Value));

    /// <summary>Alarms whose advice is their own first action; people first.</summary>
    private IReadOnlyList<AlarmView> FirstActions =>
        [.. Place.Alarms.Where(a => a.IsActive && AlarmAdvice.Of(a) is (AdviceSection.People or AdviceSection.FirstAction or AdviceSection.Measure)).OrderByDescending(a => a.DangerToPeople)];

    /// <inheritdoc/>
    protected override void OnInitialized() =>
        unit = Place.Definition.Probes.FirstOrDefault(p => p.Quantity == "alkalinity")?.Unit is { } own && QuantityCatalog.Get("alkalinity").UnitChoices.Contains(own, StringComparer.Ordinal) ? own : "mmol/L";

    private string Known()
    {
        if (!Place.Water.Values.TryGetValue("alkalinity", out WaterValue? value))
            return "Alkalinity is not known; titrate first.";
        UnitConverter.TryConvertBack("alkalinity", unit, value.Value, out double own);
        string text = $"{own.ToString("0.##", System.Globalization.CultureInfo.InvariantCulture)} {NumberText.UnitName(unit)}";
        return value.Stale ? $"Alkalinity was {text}, too long ago; titrate first." : $"Alkalinity is {text}.";
    }

    private void Plan()
    {
        plan = null;
        targetFault = null;
        if (!DecimalText.TryParse(targetText, out double target, out targetFault))
            return;
        if (!UnitConverter.TryConvert("alkalinity", unit, target, out double canonical, out targetFault))
            return;
        plan = Operations.PlanDose(Place.Definition.Key, new DoseTarget("alkalinity", canonical), reagent.Length == 0 ? [] : [reagent]);
    }
}
