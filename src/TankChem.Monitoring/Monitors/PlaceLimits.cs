using TankChem.Monitoring.Alarming;
using TankChem.Monitoring.Ports;

namespace TankChem.Monitoring.Monitors;

/// <summary>The limits of a place as charts and plans use them.</summary>
internal static class PlaceLimits
{
    /// <summary>With the value and the groups in words.</summary>
    public static IReadOnlyList<PlaceLimit> Of(IReadOnlyList<EffectiveLimit> limits)
    {
        var all = new List<PlaceLimit>(limits.Count);
        foreach (EffectiveLimit limit in limits)
        {
            LimitRule rule = LimitRules.For(limit.Limit);
            string word = limit.Limit.Level switch
            {
                LimitLevel.Warn => "limit",
                LimitLevel.Urgent => "urgent limit",
                LimitLevel.Danger => "danger limit",
            };
            string number = limit.Limit.Value.ToString("0.####", System.Globalization.CultureInfo.InvariantCulture);
            all.Add(new PlaceLimit(
                limit.Limit.Quantity,
                limit.Limit.Side == LimitSide.High,
                limit.Limit.Value,
                limit.Limit.Level != LimitLevel.Warn,
                $"{rule.Name} {word} {number}{rule.Unit} for {limit.SetBy}",
                limit.Limit.Level == LimitLevel.Danger));
        }

        return all;
    }
}
