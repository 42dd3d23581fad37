namespace TankChem.Chemistry;

/// <summary>Which published dissociation constants of carbonic acid a solution is computed with.</summary>
public enum ConstantSet
{
    /// <summary>Fresh-water constants up to practical salinity 1, Millero 2010 from 5, a smooth blend of both between.</summary>
    Auto,

    /// <summary>Plummer &amp; Busenberg 1982 with activity coefficients and ion pairs; amounts per kg of water.</summary>
    Fresh,

    /// <summary>Millero 2010, seawater-scale coefficients.</summary>
    Millero2010,

    /// <summary>Waters, Millero &amp; Woosley 2014, total-scale coefficients.</summary>
    Waters2014,

    /// <summary>Lueker, Dickson &amp; Keeling 2000, total scale; fitted for S 19–43 and 2–35 °C.</summary>
    Lueker2000,
}
