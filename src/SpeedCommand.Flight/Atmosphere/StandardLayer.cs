namespace SpeedCommand.Flight.Atmosphere;

/// <summary>One layer of constant temperature gradient (ISO 2533, tables 4 and 5), hydrostatic and ideal.</summary>
internal readonly struct StandardLayer
{
    private readonly double _baseTemperatureK;
    private readonly double _gradientKPerM;

    /// <summary>g0/(R β) where there is a gradient, g0/(R T) per metre where there is none.</summary>
    private readonly double _exponent;

    public StandardLayer(double baseM, double baseTemperatureK, double gradientKPerM, double basePressurePa)
    {
        BaseM = baseM;
        _baseTemperatureK = baseTemperatureK;
        _gradientKPerM = gradientKPerM;
        BasePressurePa = basePressurePa;
        BaseDensityKgPerM3 = basePressurePa / (StandardAtmosphere.GasConstantDryAir * baseTemperatureK);
        _exponent = StandardAtmosphere.StandardGravityMps2 / StandardAtmosphere.GasConstantDryAir
            / (gradientKPerM == 0 ? baseTemperatureK : gradientKPerM);
    }

    public double BaseM { get; }

    public double BasePressurePa { get; }

    public double BaseDensityKgPerM3 { get; }

    public StandardLayer Above(double baseM, double gradientKPerM) => new(baseM, TemperatureK(baseM), gradientKPerM, PressurePa(baseM));

    public double TemperatureK(double altitudeM) => _baseTemperatureK + _gradientKPerM * (altitudeM - BaseM);

    public double PressurePa(double altitudeM) => BasePressurePa * (_gradientKPerM == 0
        ? Math.Exp(-_exponent * (altitudeM - BaseM))
        : Math.Pow(TemperatureK(altitudeM) / _baseTemperatureK, -_exponent));

    public double DensityKgPerM3(double altitudeM) =>
        PressurePa(altitudeM) / (StandardAtmosphere.GasConstantDryAir * TemperatureK(altitudeM));

    public double AltitudeOfPressureM(double pressurePa) => AltitudeOfRatioM(pressurePa / BasePressurePa, _exponent);

    public double AltitudeOfDensityM(double densityKgPerM3) =>
        AltitudeOfRatioM(densityKgPerM3 / BaseDensityKgPerM3, _gradientKPerM == 0 ? _exponent : _exponent + 1);

    private double AltitudeOfRatioM(double ratio, double exponent) => BaseM + (_gradientKPerM == 0
        ? -Math.Log(ratio) / exponent
        : _baseTemperatureK / _gradientKPerM * (Math.Pow(ratio, -1 / exponent) - 1));
}
