using TankChem.Monitoring.Readings;

namespace TankChem.Service.Http;

/// <summary>Quality flags as the API writes them.</summary>
internal static class QualityFlagNames
{
    public static string Of(QualityFlag flag) => flag switch
    {
        QualityFlag.Pass => "pass",
        QualityFlag.NotEvaluated => "not evaluated",
        QualityFlag.Suspect => "suspect",
        QualityFlag.Fail => "fail",
        QualityFlag.Missing => "missing",
    };
}
