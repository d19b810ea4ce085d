//! What holds for every text and every interval.

use kowledger::quantity::{
    Bound, Comparison, DecimalStyle, Dimension, Interval, Outcome, ReadAs, Scale, Unit, format_interval,
    format_number, parse_limit, parse_quantity,
};
use proptest::prelude::{Just, Strategy, any, prop_assert, prop_assert_eq, prop_oneof, proptest};

const DIMENSIONS: [Dimension; 11] = [
    Dimension::Dimensionless,
    Dimension::Time,
    Dimension::Concentration,
    Dimension::VolumePerMass,
    Dimension::Pressure,
    Dimension::Temperature,
    Dimension::MolarMass,
    Dimension::Henry,
    Dimension::Percent,
    Dimension::Tonnage,
    Dimension::MolarEnergy,
];

fn read_as(dimension: Dimension, decimal: DecimalStyle) -> ReadAs {
    ReadAs { dimension, default_unit: dimension.canonical(), decimal, scale: Scale::Linear, molar_mass: None }
}

/// Numbers with at most four digits, as they are written in cells.
fn written_number() -> impl Strategy<Value = f64> {
    (-9999i32..=9999, -12i32..=10).prop_map(|(digits, power)| {
        let text = format!("{digits}e{power}");
        text.parse().unwrap_or(0.0)
    })
}

fn interval() -> impl Strategy<Value = Interval> {
    let bound = |number: f64, kind: u8| match kind {
        0 => Bound::Included(number),
        1 => Bound::Excluded(number),
        _ => Bound::Unbounded,
    };
    (written_number(), written_number(), 0u8..3, 0u8..3).prop_filter_map(
        "the ends make an interval with at least one end",
        move |(one, other, low, high)| {
            let interval = Interval::new(bound(one.min(other), low), bound(one.max(other), high)).ok()?;
            (low < 2 || high < 2).then_some(interval)
        },
    )
}

fn comparison() -> impl Strategy<Value = Comparison> {
    prop_oneof![
        Just(Comparison::Above),
        Just(Comparison::AtLeast),
        Just(Comparison::Below),
        Just(Comparison::AtMost)
    ]
}

fn meets(value: f64, comparison: Comparison, limit: f64) -> bool {
    match comparison {
        Comparison::Above => value > limit,
        Comparison::AtLeast => value >= limit,
        Comparison::Below => value < limit,
        Comparison::AtMost => value <= limit,
    }
}

/// Values of the interval: near and at its ends, near and at the limit, and between.
fn members(interval: Interval, limit: f64, shares: &[f64]) -> Vec<f64> {
    let low = interval.low().number().unwrap_or(limit.min(0.0) - 1e15);
    let high = interval.high().number().unwrap_or(limit.max(0.0) + 1e15);
    let between = shares.iter().map(|share| low + share * (high - low));
    let at_the_limit = [limit, limit.next_down(), limit.next_up(), limit - 1.0, limit + 1.0];
    [low, high, low.next_up(), high.next_down()]
        .into_iter()
        .chain(at_the_limit)
        .chain(between)
        .filter(|value| interval.contains(*value))
        .collect()
}

proptest! {
    #![proptest_config(crate::sampling())]

    #[test]
    fn no_text_panics(text in any::<String>(), comma in any::<bool>()) {
        let style = if comma { DecimalStyle::Comma } else { DecimalStyle::Point };
        for dimension in DIMENSIONS {
            let _ = parse_quantity(&text, read_as(dimension, style));
            let _ = parse_limit(&text, dimension);
        }
    }

    #[test]
    fn no_text_of_the_trade_panics(text in "[-+0-9.,eE<>≤≥~±×^()\\[\\]@;:=% µg/LdkKtoa²³⁻–'x*·]{0,40}") {
        for dimension in DIMENSIONS {
            if let Ok(parsed) = parse_quantity(&text, read_as(dimension, DecimalStyle::Point)) {
                let interval = parsed.quantity.interval;
                prop_assert!(interval.low().number().is_none_or(f64::is_finite));
                prop_assert!(interval.high().number().is_none_or(f64::is_finite));
            }
        }
    }

    #[test]
    fn an_interval_written_and_read_again_is_the_same(interval in interval(), place in 0usize..DIMENSIONS.len()) {
        let dimension = DIMENSIONS[place];
        let text = format_interval(interval, dimension.canonical());
        for style in [DecimalStyle::Point, DecimalStyle::Comma] {
            // With commas in the column, three decimals could be read as thousands.
            let ambiguous = style == DecimalStyle::Comma;
            let written = if ambiguous { text.replace('.', ",") } else { text.clone() };
            let parsed = parse_quantity(&written, read_as(dimension, style));
            prop_assert_eq!(parsed.map(|parsed| parsed.quantity.interval), Ok(interval), "{}", written);
        }
    }

    #[test]
    fn a_number_written_and_read_again_agrees_to_four_digits(number in -1e14f64..1e14, power in -20i32..10) {
        let number = number * 10f64.powi(power);
        let text = format_number(number);
        let again = parse_limit(&text, Dimension::Dimensionless).unwrap();
        prop_assert!((again - number).abs() <= 0.000_501 * number.abs(), "{number} {text}");
    }

    #[test]
    fn a_comparison_says_what_every_member_says(
        interval in interval(),
        limit in written_number(),
        comparison in comparison(),
        shares in proptest::collection::vec(0.0f64..=1.0, 16),
    ) {
        let members = members(interval, limit, &shares);
        let met = members.iter().filter(|value| meets(**value, comparison, limit)).count();
        match interval.compare(comparison, limit) {
            Outcome::Fired => prop_assert_eq!(met, members.len()),
            Outcome::Clear => prop_assert_eq!(met, 0),
            Outcome::Undecided => prop_assert!(0 < met && met < members.len(), "{interval:?} {limit} {comparison:?}"),
        }
    }
}

#[test]
fn a_limit_is_one_number_with_its_unit_and_nothing_else() {
    let limit = |text, dimension| parse_limit(text, dimension).ok();
    assert_eq!(limit("2000 L/kg", Dimension::VolumePerMass), Some(2000.0));
    assert_eq!(limit("12 °C", Dimension::Temperature), Some(12.0));
    assert_eq!(limit("2 months", Dimension::Time), Some(60.875));
    assert_eq!(limit("0.1 %", Dimension::Percent), Some(0.1));
    assert_eq!(limit("4.5", Dimension::Dimensionless), Some(4.5));
    assert_eq!(limit("65.4 kJ/mol", Dimension::MolarEnergy), Some(65.4));
    for (text, dimension) in [
        ("2000", Dimension::VolumePerMass),
        ("> 2000 L/kg", Dimension::VolumePerMass),
        ("1000-2000 L/kg", Dimension::VolumePerMass),
        ("2,000 L/kg", Dimension::VolumePerMass),
        ("60 L/kg", Dimension::Time),
        ("60 dogs", Dimension::Time),
        ("60 d or so", Dimension::Time),
        ("", Dimension::Time),
    ] {
        assert_eq!(limit(text, dimension), None, "{text}");
    }
}

#[test]
fn an_absurdly_long_text_is_refused_at_once() {
    let text = "1".repeat(5_000_000);
    let parsed = parse_quantity(&text, read_as(Dimension::Time, DecimalStyle::Point));
    assert_eq!(parsed, Err(kowledger::quantity::QuantityFault::TooLong));
}

#[test]
fn molar_concentrations_use_the_molar_mass_of_the_row() {
    let read = ReadAs { molar_mass: Some(100.0), ..read_as(Dimension::Concentration, DecimalStyle::Point) };
    let parsed = parse_quantity("2 mmol/L", read).unwrap();
    assert_eq!(parsed.quantity.single(), Some(200.0));
    assert_eq!(parsed.quantity.unit, Unit::MillimolePerLitre);
}
