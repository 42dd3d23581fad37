using TankChem.Chemistry;
using TankChem.Monitoring.Places;
using TankChem.Monitoring.Readings;

namespace TankChem.Monitoring.Water;

/// <content>What follows from the inputs by chemistry.</content>
internal sealed partial class WaterComputation
{
    private const double HectopascalPerAtm = 1013.25;
    private const double PureGasPpm = 1_000_000;

    /// <summary>From here on the major ions follow from salinity (Millero 2010 alone, see <see cref="ConstantSet.Auto"/>).</summary>
    private const double SeaSalinity = 5;

    /// <summary>Calcium of sea water over practical salinity, mmol/kg (Riley &amp; Tongudai 1967: 0.02128/40.087/1.80655 mol/kg).</summary>
    private const double SeaCalciumPerSalinity = 1000 * 0.02128 / 40.087 / 1.80655;

    private void ComputeWater(PlaceBook own)
    {
        Salt? salt = FindSalt();
        bool hasTemperature = _temperature is { IsStale: false };
        bool hasAlkalinity = _alkalinity is { IsStale: false };
        bool hasPh = _ph is { IsStale: false };

        if (Co2IsExpected(own))
        {
            if (!hasPh)
                AddGap("CO2", "ph", "pH", _ph, own);
            if (!hasAlkalinity)
                AddGap("CO2", "alkalinity", "alkalinity", _alkalinity, own);
            if (!hasTemperature)
                AddGap("CO2", "temperature", "temperature", _temperature, own);
            if (salt is null)
                AddSaltGap();
        }

        AddTanGap(own);

        if (!hasTemperature || salt is null)
            return;
        double pressureAtm = FindPressureAtm();
        ComputeOxygen(salt, pressureAtm);
        if (!hasAlkalinity)
            return;
        ComputeCarbonates(salt, pressureAtm, hasPh);
    }

    /// <summary>A loop whose pH nobody measures has no CO2 of its own to miss: it is in its tanks. Of every tank it is asked.</summary>
    private bool Co2IsExpected(PlaceBook own)
    {
        if (setup.Place.Kind == PlaceKind.Tank || own.Quantities.Count == 0 || own.Find("ph") is not null)
            return true;
        foreach (ProbeDefinition probe in setup.Place.Probes)
        {
            if (probe.Quantity == "ph")
                return true;
        }

        return false;
    }

    private void AddTanGap(PlaceBook own)
    {
        bool fresh = _tan is { IsStale: false };
        bool everHeard = _tan is not null || own.Find("tan") is not null;
        if (!fresh && (everHeard || setup.TanIsExpected))
            AddGap("NH3-N", "tan", "TAN", _tan, own);
    }

    private void AddSaltGap()
    {
        ChosenInput newest = _salinityProbe ?? _conductivity!;
        string quantity = newest.Input.Quantity;
        _gaps.Add(new KnowledgeGap("CO2", quantity, KnowledgeGapKind.TooOld, $"{quantity} last known {Moment.Words(newest.Time, now)}"));
    }

    /// <summary>Salinity: measured, else from conductivity, else as set up, else 0 and said so. Null when it was measured once and nothing else stands in: water that was salty is not taken for fresh.</summary>
    private Salt? FindSalt()
    {
        if (_salinityProbe is { IsStale: false } probe)
            return new Salt(probe.Value, probe.U ?? 0, probe, null);
        if (_conductivity is { IsStale: false } conductivity)
        {
            double salinity = PracticalSalinity.FromConductivityAt25C(conductivity.Value);
            if (double.IsFinite(salinity) && salinity >= 0)
            {
                double u = conductivity.U is { } known && conductivity.Value > 0 ? salinity * known / conductivity.Value : 0;
                return PutSalt(new Salt(salinity, u, conductivity, "salinity from conductivity"));
            }
        }

        if ((setup.Place.Salinity ?? setup.Loop?.Salinity) is { } configured)
        {
            string caveat = setup.Place.Salinity is null ? $"salinity as set up for {setup.LoopName}, not measured" : "salinity as set up, not measured";
            return PutSalt(new Salt(configured, 0.02 * configured, null, caveat));
        }

        if (_salinityProbe is not null || _conductivity is not null)
            return null;
        return PutSalt(new Salt(0, 0, null, "salinity not known: 0 (fresh water) assumed"));
    }

    private Salt PutSalt(Salt salt)
    {
        _values["salinity"] = new WaterValue
        {
            Value = salt.Salinity,
            Unit = QuantityCatalog.Get("salinity").Unit,
            U = salt.U > 0 ? salt.U : null,
            Time = salt.Probe?.Time ?? now,
            Inputs = salt.Probe is null ? [] : [salt.Probe.Input],
            Caveats = salt.Caveat is null ? [] : [salt.Caveat],
        };
        return salt;
    }

    private double FindPressureAtm()
    {
        ChosenInput? reading = _airPressure is { IsStale: false } ? _airPressure : Fresh(ChosenInput.Of(book.Of(setup.SiteKey).Find("air-pressure"), null, now));
        return reading is null ? Atmosphere.PressureAtmAtElevation(setup.Site.ElevationM) : reading.Value / HectopascalPerAtm;
    }

    private (double Ppm, double RelativeU) FindAirCo2()
    {
        ChosenInput? reading = _airCo2 is { IsStale: false } ? _airCo2 : Fresh(ChosenInput.Of(book.Of(setup.SiteKey).Find("air-co2"), null, now));
        return reading is { Value: > 0 } ? (reading.Value, (reading.U ?? 0) / reading.Value) : (setup.Place.AirCo2Ppm ?? setup.Site.AirCo2Ppm, 0.05);
    }

    private ChosenInput? Fresh(ChosenInput? input)
    {
        if (input is null or { IsStale: true })
            return null;
        if (input.UsedUntil < _staysUntil)
            _staysUntil = input.UsedUntil;
        return input;
    }

    private void ComputeOxygen(Salt salt, double pressureAtm)
    {
        double saturation = DissolvedOxygen.SaturationMgL(_temperature!.Value, salt.Salinity, pressureAtm);
        if (!double.IsFinite(saturation) || saturation <= 0)
            return;

        // A probe measures one of the two; the other follows. Solubility changes by about 2 % a degree (Benson & Krause 1984).
        double relativeTemperature = 0.02 * (_temperature.U ?? 0);
        if (_oxygen is { IsStale: false } oxygen && _oxygenSaturation is null or { IsStale: true })
        {
            double percent = 100 * oxygen.Value / saturation;
            PutComputed("oxygen-saturation", percent, Combine(percent, oxygen, relativeTemperature), GroundOf(oxygen, _temperature));
        }
        else if (_oxygenSaturation is { IsStale: false } share && _oxygen is null or { IsStale: true })
        {
            double amount = share.Value / 100 * saturation;
            PutComputed("oxygen", amount, Combine(amount, share, relativeTemperature), GroundOf(share, _temperature));
        }
    }

    private static double? Combine(double value, ChosenInput input, double relative) =>
        input.U is { } u && input.Value > 0 ? value * Math.Sqrt(Math.Pow(u / input.Value, 2) + relative * relative) : null;

    private static Ground GroundOf(ChosenInput first, ChosenInput second) =>
        new(first.Time > second.Time ? first.Time : second.Time, [first.Input, second.Input], CaveatsOf(first, second));

    private static string[] CaveatsOf(ChosenInput first, ChosenInput second) => (first.Caveat, second.Caveat) switch
    {
        (null, null) => [],
        (null, _) => [$"{second.Input.Quantity} {second.Caveat}"],
        (_, null) => [$"{first.Input.Quantity} {first.Caveat}"],
        _ => [$"{first.Input.Quantity} {first.Caveat}", $"{second.Input.Quantity} {second.Caveat}"],
    };

    private void ComputeCarbonates(Salt salt, double pressureAtm, bool hasPh)
    {
        double temperature = _temperature!.Value;
        double density = Density.KgPerL(temperature, salt.Salinity);
        double alkalinityUmolKg = _alkalinity!.Value * 1000 / density;
        Solution solution = MakeSolution(salt, pressureAtm, density);

        ComputeAir(solution, alkalinityUmolKg, salt);
        if (!hasPh)
            return;

        var input = new CarbonateInput { PH = _ph!.Value, AlkalinityUmolKg = alkalinityUmolKg, Scale = PhScale.Nbs };
        var uncertainty = new InputUncertainty
        {
            PH = _ph.U ?? 0,
            AlkalinityUmolKg = (_alkalinity.U ?? 0) * 1000 / density,
            TemperatureC = _temperature.U ?? 0,
            Salinity = salt.U,
            IncludeConstants = true,
        };
        (CarbonateState state, CarbonateUncertainty u) = memo.Water(solution, input, uncertainty);
        if (state.Status != SolveStatus.Solved || !double.IsFinite(state.Co2UmolKg))
        {
            _gaps.Add(new KnowledgeGap("CO2", "ph", KnowledgeGapKind.Impossible, state.FaultyArgument ?? "pH and alkalinity do not belong to one water"));
            return;
        }

        PutCarbonates(state, u, CarbonateGround(state.Caveats, salt, _ph), salt);
    }

    private Solution MakeSolution(Salt salt, double pressureAtm, double density)
    {
        var bare = new Solution
        {
            TemperatureC = _temperature!.Value,
            Salinity = salt.Salinity,
            PressureAtm = pressureAtm,
            AmmoniaUmolKg = _tan is { IsStale: false } tan ? tan.Value / MolarMass.Nitrogen * 1000 / density : 0,
        };
        bool ownIons = setup.Place.Ions is not null || setup.Place.HardnessMmolL is not null;
        PlaceDefinition? source = ownIons ? setup.Place : setup.Loop;
        return IonConverter.WithIons(bare, source?.Ions, source?.HardnessMmolL, _calcium is { IsStale: false } calcium ? calcium.Value : null, density);
    }

    private void PutCarbonates(in CarbonateState state, in CarbonateUncertainty u, Ground ground, Salt salt)
    {
        double mmolPerL = state.DensityKgPerL * 1e-3;
        PutComputed("co2", state.Co2MgL, u.Co2MgL, ground);
        PutComputed("hco3", state.Hco3UmolKg * mmolPerL, u.Hco3UmolKg * mmolPerL, ground);
        PutComputed("co3", state.Co3UmolKg * mmolPerL, u.Co3UmolKg * mmolPerL, ground);
        PutComputed("dic", state.DicUmolKg * mmolPerL, u.DicUmolKg * mmolPerL, ground);
        PutComputed("pco2", state.Pco2Uatm, u.Pco2Uatm, ground);
        PutComputed("buffer-closed", state.BufferClosedUmolKg * mmolPerL, u.BufferClosedUmolKg * mmolPerL, ground);
        PutComputed("buffer-open", state.BufferOpenUmolKg * mmolPerL, u.BufferOpenUmolKg * mmolPerL, ground);
        PutOmega(state, u, ground, salt);
        if (_tan is { IsStale: false } tan)
        {
            double byShare = tan.Value * u.Nh3Fraction;
            double byTan = state.Nh3Fraction * (tan.U ?? 0);
            Ground withTan = ground with { Time = tan.Time > ground.Time ? tan.Time : ground.Time, Inputs = [.. ground.Inputs, tan.Input] };
            if (tan.Caveat is not null)
                withTan = withTan with { Caveats = [.. ground.Caveats, $"TAN {tan.Caveat}"] };
            PutComputed("nh3-n", state.Nh3Fraction * tan.Value, Math.Sqrt(byShare * byShare + byTan * byTan), withTan);
        }
    }

    /// <summary>Saturation states need calcium: known in fresh water only when somebody gave it, in the sea by salinity, or as measured.</summary>
    private void PutOmega(in CarbonateState state, in CarbonateUncertainty u, Ground ground, Salt salt)
    {
        bool isSea = salt.Salinity >= SeaSalinity;
        PlaceDefinition? source = setup.Place.Ions is not null || setup.Place.HardnessMmolL is not null ? setup.Place : setup.Loop;
        bool knownFresh = source?.Ions?.CalciumMgL is not null || source?.HardnessMmolL is not null;
        if (!isSea && !knownFresh)
            return;
        double factor = 1;
        if (isSea && _calcium is { IsStale: false } calcium)
        {
            factor = calcium.Value / MolarMass.Calcium / state.DensityKgPerL / (SeaCalciumPerSalinity * salt.Salinity);
            ground = ground with { Inputs = [.. ground.Inputs, calcium.Input] };
        }

        PutComputed("omega-calcite", state.OmegaCalcite * factor, u.OmegaCalcite * factor, ground);
        PutComputed("omega-aragonite", state.OmegaAragonite * factor, u.OmegaAragonite * factor, ground);
    }

    private void ComputeAir(Solution solution, double alkalinityUmolKg, Salt salt)
    {
        (double ppm, double relativeU) = FindAirCo2();
        CarbonateState air = memo.Air(solution, GasInput(solution, alkalinityUmolKg, ppm));
        if (air.Status == SolveStatus.Solved)
        {
            Ground ground = CarbonateGround(air.Caveats, salt, null);
            PutComputed("ph-air", air.PhNbs, UncertaintyAtGas(air, relativeU), ground);

            // Henry's constant of CO2 changes by about 3 % a degree (Weiss 1974).
            double relativeTemperature = 0.03 * (_temperature!.U ?? 0);
            PutComputed("co2-air", air.Co2MgL, air.Co2MgL * Math.Sqrt(relativeU * relativeU + relativeTemperature * relativeTemperature), ground);
        }

        if (!setup.Place.Co2Injection)
            return;
        CarbonateState injected = memo.Injected(solution, GasInput(solution, alkalinityUmolKg, PureGasPpm));
        if (injected.Status == SolveStatus.Solved)
            PutComputed("ph-injected", injected.PhNbs, UncertaintyAtGas(injected, 0), CarbonateGround(injected.Caveats, salt, null));
    }

    private static CarbonateInput GasInput(Solution solution, double alkalinityUmolKg, double ppm) => new()
    {
        AlkalinityUmolKg = alkalinityUmolKg,
        Pco2Uatm = Atmosphere.Pco2Uatm(ppm, solution.PressureAtm, solution.TemperatureC, solution.Salinity),
        Scale = PhScale.Nbs,
    };

    /// <summary>Of the pH at a fixed pCO2: by alkalinity through the open buffer intensity, by the gas about one pH unit a decade.</summary>
    private double? UncertaintyAtGas(in CarbonateState state, double relativeGas)
    {
        if (!(state.BufferOpenUmolKg > 0) || _alkalinity!.U is not { } u)
            return null;
        double byAlkalinity = u * 1000 / state.DensityKgPerL / state.BufferOpenUmolKg;
        double byGas = relativeGas / Math.Log(10);
        return Math.Sqrt(byAlkalinity * byAlkalinity + byGas * byGas);
    }

    private Ground CarbonateGround(Caveats flags, Salt salt, ChosenInput? ph)
    {
        var inputs = new List<WaterInput>(4);
        DateTimeOffset time = _alkalinity!.Time > _temperature!.Time ? _alkalinity.Time : _temperature.Time;
        var caveats = new List<string>(4);
        if (ph is not null)
        {
            inputs.Add(ph.Input);
            time = ph.Time > time ? ph.Time : time;
            AddCaveat(caveats, "pH", ph);
        }

        inputs.Add(_alkalinity.Input);
        inputs.Add(_temperature.Input);
        AddCaveat(caveats, "alkalinity", _alkalinity);
        AddCaveat(caveats, "temperature", _temperature);
        if (salt.Probe is not null)
            inputs.Add(salt.Probe.Input);
        if (salt.Caveat is not null)
            caveats.Add(salt.Caveat);
        if (flags.HasFlag(Caveats.IonsAssumed))
            caveats.Add("ions not known: ionic strength estimated from alkalinity");
        if (flags.HasFlag(Caveats.IonsFromHardness))
            caveats.Add("only hardness known: calcium and magnesium split by a typical ratio");
        if (flags.HasFlag(Caveats.OutOfFittedRange))
            caveats.Add("temperature or salinity outside the range the constants were fitted in");
        if (flags.HasFlag(Caveats.Blended))
            caveats.Add("brackish: fresh-water and sea-water models blended");
        return new Ground(time, inputs, caveats);
    }

    private static void AddCaveat(List<string> caveats, string name, ChosenInput input)
    {
        if (input.Caveat is not null)
            caveats.Add($"{name} {input.Caveat}");
    }

    /// <summary>The salinity to compute with.</summary>
    private sealed record Salt(double Salinity, double U, ChosenInput? Probe, string? Caveat);
}
