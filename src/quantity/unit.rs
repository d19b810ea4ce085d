//! Units of the trade, their dimension, and their conversion to the canonical unit of that dimension.

/// Days in a month, declared once: a twelfth of 365.25 days. Rulebooks that count in months convert with it.
pub const DAYS_PER_MONTH: f64 = 30.4375;

/// What a number measures. Each has one canonical unit in which intervals are kept.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum Dimension {
    /// Ratios and their logarithms: log Kow, log Koa, pKa, BMF, TMF. Canonical: the bare number.
    Dimensionless,
    /// Half-lives. Canonical: days.
    Time,
    /// Solubility and effect concentrations. Canonical: mg/L.
    Concentration,
    /// BCF, BAF, Koc. Canonical: L/kg.
    VolumePerMass,
    /// Vapour pressure. Canonical: Pa.
    Pressure,
    /// Melting and boiling points, test temperatures. Canonical: °C.
    Temperature,
    /// Canonical: g/mol.
    MolarMass,
    /// Henry's law constant. Canonical: Pa m³/mol.
    Henry,
    /// Contents, degradation, lipid. Canonical: %.
    Percent,
    /// Canonical: t/a.
    Tonnage,
    /// Activation energy in rulebooks. Canonical: kJ/mol.
    MolarEnergy,
}

impl Dimension {
    /// The unit in which intervals of this dimension are kept.
    pub fn canonical(self) -> Unit {
        match self {
            Self::Dimensionless => Unit::One,
            Self::Time => Unit::Day,
            Self::Concentration => Unit::MilligramPerLitre,
            Self::VolumePerMass => Unit::LitrePerKilogram,
            Self::Pressure => Unit::Pascal,
            Self::Temperature => Unit::Celsius,
            Self::MolarMass => Unit::GramPerMole,
            Self::Henry => Unit::PascalCubicMetrePerMole,
            Self::Percent => Unit::Percent,
            Self::Tonnage => Unit::TonnePerYear,
            Self::MolarEnergy => Unit::KilojoulePerMole,
        }
    }
}

/// A unit a cell or rule file may use.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum Unit {
    /// No unit.
    One,
    /// s
    Second,
    /// min
    Minute,
    /// h
    Hour,
    /// d
    Day,
    /// wk
    Week,
    /// mo, see [`DAYS_PER_MONTH`]
    Month,
    /// a, twelve months
    Year,
    /// ng/L
    NanogramPerLitre,
    /// µg/L, also ppb in water
    MicrogramPerLitre,
    /// mg/L, also ppm in water
    MilligramPerLitre,
    /// g/L
    GramPerLitre,
    /// mol/L; becomes mg/L only with the molar mass
    MolePerLitre,
    /// mmol/L; becomes mg/L only with the molar mass
    MillimolePerLitre,
    /// µmol/L; becomes mg/L only with the molar mass
    MicromolePerLitre,
    /// L/kg, also dm³/kg, mL/g and cm³/g
    LitrePerKilogram,
    /// The decimal logarithm of a value in L/kg
    LogLitrePerKilogram,
    /// Pa
    Pascal,
    /// hPa, also mbar
    Hectopascal,
    /// kPa
    Kilopascal,
    /// bar
    Bar,
    /// mmHg, also Torr
    MillimetreMercury,
    /// atm
    Atmosphere,
    /// °C
    Celsius,
    /// K
    Kelvin,
    /// °F
    Fahrenheit,
    /// g/mol
    GramPerMole,
    /// Pa m³/mol
    PascalCubicMetrePerMole,
    /// atm m³/mol
    AtmosphereCubicMetrePerMole,
    /// %
    Percent,
    /// t/a
    TonnePerYear,
    /// kg/a
    KilogramPerYear,
    /// kJ/mol
    KilojoulePerMole,
    /// pg/L
    PicogramPerLitre,
    /// kg/L, also g/mL and g/cm³
    KilogramPerLitre,
    /// g/100 mL, also % w/v
    GramPerDecilitre,
    /// mg/100 mL
    MilligramPerDecilitre,
    /// nmol/L; becomes mg/L only with the molar mass
    NanomolePerLitre,
    /// L/g, also m³/kg
    LitrePerGram,
    /// µPa
    Micropascal,
    /// mPa
    Millipascal,
    /// MPa
    Megapascal,
    /// mTorr
    Millitorr,
    /// psi
    PoundPerSquareInch,
    /// kg/mol, also kDa
    KilogramPerMole,
    /// kPa m³/mol
    KilopascalCubicMetrePerMole,
    /// atm L/mol
    AtmosphereLitrePerMole,
    /// g/kg, also ‰
    GramPerKilogram,
    /// mg/kg, also ppm of a content
    MilligramPerKilogram,
    /// µg/kg, also ppb of a content
    MicrogramPerKilogram,
    /// kt/a
    KilotonnePerYear,
    /// `j`, days in a French text and years in a German one; who reads it must know which
    Jour,
    /// A ratio where its logarithm is asked for: `Kow = 50000`. Becomes its decimal logarithm
    Ratio,
    /// A logarithm where the ratio is asked for: `log BMF = 0.3`. Becomes the ratio
    LogarithmOfRatio,
    /// A logarithm written as its power of ten: `10^4.5`. Becomes the exponent
    PowerOfTen,
}

impl Unit {
    /// Every unit.
    pub const ALL: [Self; 55] = [
        Self::One,
        Self::Second,
        Self::Minute,
        Self::Hour,
        Self::Day,
        Self::Week,
        Self::Month,
        Self::Year,
        Self::NanogramPerLitre,
        Self::MicrogramPerLitre,
        Self::MilligramPerLitre,
        Self::GramPerLitre,
        Self::MolePerLitre,
        Self::MillimolePerLitre,
        Self::MicromolePerLitre,
        Self::LitrePerKilogram,
        Self::LogLitrePerKilogram,
        Self::Pascal,
        Self::Hectopascal,
        Self::Kilopascal,
        Self::Bar,
        Self::MillimetreMercury,
        Self::Atmosphere,
        Self::Celsius,
        Self::Kelvin,
        Self::Fahrenheit,
        Self::GramPerMole,
        Self::PascalCubicMetrePerMole,
        Self::AtmosphereCubicMetrePerMole,
        Self::Percent,
        Self::TonnePerYear,
        Self::KilogramPerYear,
        Self::KilojoulePerMole,
        Self::PicogramPerLitre,
        Self::KilogramPerLitre,
        Self::GramPerDecilitre,
        Self::MilligramPerDecilitre,
        Self::NanomolePerLitre,
        Self::LitrePerGram,
        Self::Micropascal,
        Self::Millipascal,
        Self::Megapascal,
        Self::Millitorr,
        Self::PoundPerSquareInch,
        Self::KilogramPerMole,
        Self::KilopascalCubicMetrePerMole,
        Self::AtmosphereLitrePerMole,
        Self::GramPerKilogram,
        Self::MilligramPerKilogram,
        Self::MicrogramPerKilogram,
        Self::KilotonnePerYear,
        Self::Jour,
        Self::Ratio,
        Self::LogarithmOfRatio,
        Self::PowerOfTen,
    ];

    /// What the unit measures.
    pub fn dimension(self) -> Dimension {
        match self {
            Self::One | Self::Ratio | Self::LogarithmOfRatio | Self::PowerOfTen => Dimension::Dimensionless,
            Self::Second
            | Self::Minute
            | Self::Hour
            | Self::Day
            | Self::Week
            | Self::Month
            | Self::Year
            | Self::Jour => Dimension::Time,
            Self::NanogramPerLitre
            | Self::MicrogramPerLitre
            | Self::MilligramPerLitre
            | Self::GramPerLitre
            | Self::MolePerLitre
            | Self::MillimolePerLitre
            | Self::MicromolePerLitre
            | Self::PicogramPerLitre
            | Self::KilogramPerLitre
            | Self::GramPerDecilitre
            | Self::MilligramPerDecilitre
            | Self::NanomolePerLitre => Dimension::Concentration,
            Self::LitrePerKilogram | Self::LogLitrePerKilogram | Self::LitrePerGram => {
                Dimension::VolumePerMass
            }
            Self::Pascal
            | Self::Hectopascal
            | Self::Kilopascal
            | Self::Bar
            | Self::MillimetreMercury
            | Self::Atmosphere
            | Self::Micropascal
            | Self::Millipascal
            | Self::Megapascal
            | Self::Millitorr
            | Self::PoundPerSquareInch => Dimension::Pressure,
            Self::Celsius | Self::Kelvin | Self::Fahrenheit => Dimension::Temperature,
            Self::GramPerMole | Self::KilogramPerMole => Dimension::MolarMass,
            Self::PascalCubicMetrePerMole
            | Self::AtmosphereCubicMetrePerMole
            | Self::KilopascalCubicMetrePerMole
            | Self::AtmosphereLitrePerMole => Dimension::Henry,
            Self::Percent
            | Self::GramPerKilogram
            | Self::MilligramPerKilogram
            | Self::MicrogramPerKilogram => Dimension::Percent,
            Self::TonnePerYear | Self::KilogramPerYear | Self::KilotonnePerYear => Dimension::Tonnage,
            Self::KilojoulePerMole => Dimension::MolarEnergy,
        }
    }

    /// How a reader writes the unit.
    pub fn symbol(self) -> &'static str {
        match self {
            Self::One | Self::Ratio | Self::LogarithmOfRatio | Self::PowerOfTen => "",
            Self::Second => "s",
            Self::Minute => "min",
            Self::Hour => "h",
            Self::Day => "d",
            Self::Week => "wk",
            Self::Month => "mo",
            Self::Year => "a",
            Self::NanogramPerLitre => "ng/L",
            Self::MicrogramPerLitre => "µg/L",
            Self::MilligramPerLitre => "mg/L",
            Self::GramPerLitre => "g/L",
            Self::MolePerLitre => "mol/L",
            Self::MillimolePerLitre => "mmol/L",
            Self::MicromolePerLitre => "µmol/L",
            Self::LitrePerKilogram => "L/kg",
            Self::LogLitrePerKilogram => "log L/kg",
            Self::Pascal => "Pa",
            Self::Hectopascal => "hPa",
            Self::Kilopascal => "kPa",
            Self::Bar => "bar",
            Self::MillimetreMercury => "mmHg",
            Self::Atmosphere => "atm",
            Self::Celsius => "°C",
            Self::Kelvin => "K",
            Self::Fahrenheit => "°F",
            Self::GramPerMole => "g/mol",
            Self::PascalCubicMetrePerMole => "Pa m³/mol",
            Self::AtmosphereCubicMetrePerMole => "atm m³/mol",
            Self::Percent => "%",
            Self::TonnePerYear => "t/a",
            Self::KilogramPerYear => "kg/a",
            Self::KilojoulePerMole => "kJ/mol",
            Self::PicogramPerLitre => "pg/L",
            Self::KilogramPerLitre => "kg/L",
            Self::GramPerDecilitre => "g/100 mL",
            Self::MilligramPerDecilitre => "mg/100 mL",
            Self::NanomolePerLitre => "nmol/L",
            Self::LitrePerGram => "L/g",
            Self::Micropascal => "µPa",
            Self::Millipascal => "mPa",
            Self::Megapascal => "MPa",
            Self::Millitorr => "mTorr",
            Self::PoundPerSquareInch => "psi",
            Self::KilogramPerMole => "kg/mol",
            Self::KilopascalCubicMetrePerMole => "kPa m³/mol",
            Self::AtmosphereLitrePerMole => "atm L/mol",
            Self::GramPerKilogram => "g/kg",
            Self::MilligramPerKilogram => "mg/kg",
            Self::MicrogramPerKilogram => "µg/kg",
            Self::KilotonnePerYear => "kt/a",
            Self::Jour => "j",
        }
    }

    /// Whether a value of this unit was written as its logarithm, or as the value where its logarithm is kept.
    pub fn is_rescaled(self) -> bool {
        matches!(self, Self::LogLitrePerKilogram | Self::Ratio | Self::LogarithmOfRatio | Self::PowerOfTen)
    }

    /// The number in the canonical unit of the dimension; every conversion increases with the number.
    ///
    /// `molar_mass` (g/mol) is needed for the molar concentrations only; without it they give `None`.
    pub fn to_canonical(self, number: f64, molar_mass: Option<f64>) -> Option<f64> {
        const PASCALS_PER_ATMOSPHERE: f64 = 101_325.0;
        // The conventional millimetre of mercury (ISO 80000-4).
        const PASCALS_PER_MILLIMETRE_MERCURY: f64 = 133.322_387_415;
        Some(match self {
            Self::One
            | Self::Day
            | Self::MilligramPerLitre
            | Self::LitrePerKilogram
            | Self::Pascal
            | Self::Celsius
            | Self::GramPerMole
            | Self::PascalCubicMetrePerMole
            | Self::Percent
            | Self::TonnePerYear
            | Self::KilojoulePerMole
            | Self::Jour
            | Self::PowerOfTen => number,
            Self::Second => number / 86_400.0,
            Self::Minute => number / 1_440.0,
            Self::Hour => number / 24.0,
            Self::Week => number * 7.0,
            Self::Month => number * DAYS_PER_MONTH,
            Self::Year => number * 12.0 * DAYS_PER_MONTH,
            Self::NanogramPerLitre | Self::Micropascal => number / 1e6,
            Self::MicrogramPerLitre | Self::KilogramPerYear | Self::Millipascal => number / 1e3,
            Self::GramPerLitre
            | Self::Kilopascal
            | Self::LitrePerGram
            | Self::KilogramPerMole
            | Self::KilopascalCubicMetrePerMole
            | Self::KilotonnePerYear => number * 1e3,
            Self::PicogramPerLitre => number / 1e9,
            Self::KilogramPerLitre | Self::Megapascal => number * 1e6,
            Self::GramPerDecilitre => number * 1e4,
            Self::MilligramPerDecilitre => number * 10.0,
            Self::NanomolePerLitre => number * molar_mass? / 1e6,
            Self::Millitorr => number * PASCALS_PER_MILLIMETRE_MERCURY / 1e3,
            // One pound-force (0.45359237 kg at 9.80665 m/s²) on a square of 0.0254 m.
            Self::PoundPerSquareInch => number * 6_894.757_293_168,
            Self::AtmosphereLitrePerMole => number * PASCALS_PER_ATMOSPHERE / 1e3,
            Self::GramPerKilogram => number / 10.0,
            Self::MilligramPerKilogram => number / 1e4,
            Self::MicrogramPerKilogram => number / 1e7,
            // A ratio that is not positive has no logarithm; what is not finite is no interval.
            Self::Ratio => number.log10(),
            Self::MolePerLitre => number * molar_mass? * 1e3,
            Self::MillimolePerLitre => number * molar_mass?,
            Self::MicromolePerLitre => number * molar_mass? / 1e3,
            Self::LogLitrePerKilogram | Self::LogarithmOfRatio => 10f64.powf(number),
            Self::Hectopascal => number * 1e2,
            Self::Bar => number * 1e5,
            Self::MillimetreMercury => number * PASCALS_PER_MILLIMETRE_MERCURY,
            Self::Atmosphere | Self::AtmosphereCubicMetrePerMole => number * PASCALS_PER_ATMOSPHERE,
            Self::Kelvin => number - 273.15,
            Self::Fahrenheit => (number - 32.0) / 1.8,
        })
    }
}

#[cfg(test)]
mod tests {
    use super::Unit;

    #[test]
    fn a_log_koc_of_three_is_exactly_a_thousand_litres_per_kilogram() {
        for (log, linear) in [(2.0, 100.0), (3.0, 1000.0)] {
            let converted = Unit::LogLitrePerKilogram.to_canonical(log, None).unwrap();
            assert_eq!(converted.total_cmp(&linear), std::cmp::Ordering::Equal);
        }
    }

    #[test]
    fn molar_concentrations_need_the_molar_mass() {
        assert_eq!(Unit::MolePerLitre.to_canonical(1.0, None), None);
        assert_eq!(Unit::MicromolePerLitre.to_canonical(10.0, Some(100.0)), Some(1.0));
    }

    #[test]
    fn months_and_years_agree() {
        assert_eq!(Unit::Month.to_canonical(12.0, None), Unit::Year.to_canonical(1.0, None));
    }
}
