using TankChem.Alarms;
using TankChem.Monitoring.Alarming;
using TankChem.Monitoring.Readings;
using TankChem.Monitoring.Water;

namespace TankChem.Monitoring.Monitors;

/// <summary>Watches whether we can vouch for the values that matter; about our knowledge, not about the water.</summary>
internal sealed class VouchWatch(AlarmKey key, AlarmState state) : WatchedRule(key, state)
{
    /// <summary>Rule id.</summary>
    public const string Rule = "cannot-vouch";

    private readonly List<KnowledgeGap> _gaps = [];

    private static readonly AlarmSettings Usual = new() { OnDelay = TimeSpan.FromMinutes(5) };
    private static readonly AlarmSettings BeforeFirstTest = new() { OnDelay = TimeSpan.FromDays(1) };

    /// <summary>A place that was just set up gets a day for its first titration; what was known once is missed at once.</summary>
    public override AlarmSettings Settings => _gaps.Count > 0 && _gaps.TrueForAll(gap => gap.Kind == KnowledgeGapKind.NeverKnown) ? BeforeFirstTest : Usual;

    public override AlarmPriority Priority => AlarmPriority.Medium;

    public override string Title => "Cannot vouch";

    public override string Quantity => _gaps.Count > 0 ? _gaps[0].Quantity : "alkalinity";

    public override bool AboutKnowledge => true;

    public override string FirstAction => _gaps.Count > 0 ? $"{Capital(Action(_gaps[0]))}." : "Nothing to do.";

    public override string Consequence => "The water may be out of its limits without an alarm.";

    public override AlarmEventKind Assess(PlaceWatch watch)
    {
        _gaps.Clear();
        bool phIsKnown = watch.Water.State.Values.TryGetValue("ph", out WaterValue? ph) && !ph.Stale;
        foreach (KnowledgeGap gap in watch.Water.Gaps)
        {
            if (Counts(gap, watch, phIsKnown))
                _gaps.Add(gap);
        }

        _gaps.AddRange(watch.Doubts);
        return _gaps.Count > 0 ? AlarmEventKind.ConditionPresent : AlarmEventKind.ConditionAbsent;
    }

    public override string Sentence(DateTimeOffset now)
    {
        if (_gaps.Count == 0)
            return "All values that matter are known again.";
        KnowledgeGap first = _gaps[0];
        var texts = new List<string> { first.Text };
        foreach (KnowledgeGap gap in _gaps)
        {
            if (gap.Value == first.Value && !texts.Contains(gap.Text))
                texts.Add(gap.Text);
        }

        string sentence = $"Cannot vouch for {first.Value}: {string.Join(", ", texts)}; {Action(first)}.";
        KnowledgeGap? other = _gaps.Find(gap => gap.Value != first.Value);
        return other is null ? sentence : $"{sentence} Nor for {other.Value}: {other.Text}; {Action(other)}.";
    }

    // A probe that fell silent has an alarm of its own. What was never measured is named in the water state and nags nobody,
    // except where pH is there to judge CO2 by and only a titration is missing.
    private static bool Counts(KnowledgeGap gap, PlaceWatch watch, bool phIsKnown) => gap.Kind switch
    {
        KnowledgeGapKind.NeverKnown => phIsKnown && gap.Value == "CO2" && watch.Setup.Place.Stock.Count > 0,
        KnowledgeGapKind.TooOld => !IsToldBySilence(gap.Quantity, watch),
        KnowledgeGapKind.NotUsable => true,
        KnowledgeGapKind.Impossible => true,
    };

    private static bool IsToldBySilence(string quantity, PlaceWatch watch)
    {
        if (SilenceWatch.LongestSilence(QuantityCatalog.Get(quantity)) is null)
            return false;
        return HasProbe(watch.Book.Of(watch.Setup.Place.Key), quantity) || (watch.Setup.IsInLoop && HasProbe(watch.Book.Of(watch.Setup.LoopKey), quantity));
    }

    private static bool HasProbe(PlaceBook place, string quantity)
    {
        if (place.Find(quantity) is not { } known)
            return false;
        foreach (SeriesBook series in known.Probes)
        {
            if (series.Latest.Origin != ReadingOrigin.Manual && !series.Latest.IsUsable)
                return false;
            if (series.Latest.Origin != ReadingOrigin.Manual)
                return true;
        }

        return false;
    }

    private static string Action(KnowledgeGap gap) => (gap.Kind, gap.Quantity) switch
    {
        (KnowledgeGapKind.NotUsable, _) => "confirm its unit or look at the probe",
        (KnowledgeGapKind.Impossible, _) => "check the pH probe in a buffer and titrate again",
        (_, "alkalinity") => "titrate now",
        (_, "tan") => "test TAN now",
        (_, "ph") => "measure pH now",
        _ => $"measure {gap.Quantity} now",
    };

    private static string Capital(string text) => char.ToUpperInvariant(text[0]) + text[1..];
}
