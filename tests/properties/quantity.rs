//! What holds for every text and every interval.

use kowledger::quantity::{
    Bound, Comparison, DecimalStyle, Dimension, Interval, LetterA, Outcome, ReadAs, Scale, Unit,
    format_interval, format_number, parse_limit, parse_quantities, parse_quantity,
};
use proptest::prelude::{Just, Strategy, any, prop_assert, prop_assert_eq, prop_oneof, proptest};
use proptest::sample::select;

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

/// A sign, and words that say the same; `#` stands before those that follow the number.
const QUALIFIERS: [(&str, &str); 5] = [
    (
        ">",
        "greater than|größer als|supérieur à|plus de|mayor que|más de|maggiore di|più di|groter dan|meer dan|大于|大於|超过|#超|#より大きい|#を超える",
    ),
    (
        "≥",
        "at least|mindestens|au moins|al menos|almeno|ten minste|少なくとも|至少|不小于|#以上|#or more|#ou plus|#o más|#o più|#of meer",
    ),
    (
        "<",
        "less than|kleiner als|inférieur à|moins de|menor que|menos de|minore di|meno di|kleiner dan|minder dan|小于|低于|#未満|#より小さい",
    ),
    (
        "≤",
        "at most|höchstens|au plus|como máximo|al massimo|ten hoogste|多くとも|不大于|不超过|#以下|#or less|#ou moins|#o menos|#o meno|#of minder",
    ),
    ("", "from|equal to|gleich|égal à|igual a|uguale a|gelijk aan|等于"),
];

/// What cells are made of.
const VOCABULARY: &str = concat!(
    "4.5|4,5|1.234|1,234|10^3|10^4.5|1E-5|×10⁻³|-|–|~|±|<|>|≤|≥|=|:|;|,|/|@|(|)|[|]|%|°C|mg/L|µg/L|d|wk|a|j|J|h|L/kg|Pa|ppm|t/a|log|",
    "log Kow|Kow|BCF|Koc|DT50|DT90|LC50|pH|OECD 117|and|und|et|y|e|o|of|to|à|a|tot|から|まで|至|と|の間|between|entre|tussen|介于|",
    "以上|未満|約|左右|日|か月|天|年|毫克/升|not|nicht|不|未測定|n.d.|データなし|measured|calculated|実測値|1998|2000|½|ー|．|５|\n|",
    "\u{3000}|\u{AD}|\u{200B}|&lt;|*|'|\"|stable|insoluble|no degradation|min|max|ca.|Smith et al."
);

fn read_as(dimension: Dimension, decimal: DecimalStyle) -> ReadAs {
    ReadAs {
        dimension,
        default_unit: dimension.canonical(),
        decimal,
        scale: Scale::Linear,
        molar_mass: None,
        letter_a: LetterA::Year,
    }
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
    fn an_interval_in_any_unit_is_read_in_that_unit(interval in interval(), place in 0usize..Unit::ALL.len()) {
        let unit = Unit::ALL[place];
        let dimension = unit.dimension();
        let canonical = interval.map_increasing(|number| unit.to_canonical(number, Some(250.0)).unwrap_or(f64::NAN));
        // Units without a symbol are set by words; a power of ten may leave every range.
        if let (Ok(canonical), true) = (canonical, unit == Unit::One || !unit.symbol().is_empty()) {
            let text = format_interval(interval, unit);
            for (written, style) in [(text.clone(), DecimalStyle::Point), (text.replace('.', ","), DecimalStyle::Comma)] {
                let read = ReadAs { molar_mass: Some(250.0), ..read_as(dimension, style) };
                let parsed = parse_quantity(&written, read).map(|parsed| parsed.quantity);
                let found = parsed.map(|quantity| (quantity.interval, quantity.unit));
                prop_assert_eq!(found, Ok((canonical, unit)), "{}", written);
            }
        }
    }

    #[test]
    fn a_qualifier_in_any_language_is_its_sign(
        number in 1i32..10_000,
        place in 0usize..QUALIFIERS.len(),
        spaced in any::<bool>(),
    ) {
        let (sign, words) = QUALIFIERS[place];
        let expected = parse_quantity(&format!("{sign} {number} d"), read_as(Dimension::Time, DecimalStyle::Point));
        for word in words.split('|') {
            let east_asian = !word.is_ascii() && word.chars().all(|letter| letter > '\u{3000}' || letter == '#');
            let gap = if east_asian && !spaced { "" } else { " " };
            let text = match word.strip_prefix('#') {
                Some(after) => format!("{number} d{gap}{after}"),
                None => format!("{word}{gap}{number} d"),
            };
            let found = parse_quantity(&text, read_as(Dimension::Time, DecimalStyle::Point));
            let interval = |parsed: &Result<kowledger::quantity::Parsed, _>| {
                parsed.as_ref().map(|parsed| parsed.quantity.interval).map_err(Clone::clone)
            };
            prop_assert_eq!(interval(&found), interval(&expected), "{}", text);
        }
    }

    #[test]
    fn values_with_semicolons_between_are_read_in_order(
        intervals in proptest::collection::vec(interval(), 1..=20),
        separator in 0usize..3,
    ) {
        let texts: Vec<String> = intervals.iter().map(|interval| format_interval(*interval, Unit::Pascal)).collect();
        let text = texts.join(["; ", "\n", ";"][separator]);
        if text.len() <= 2_000 {
            let parsed = parse_quantities(&text, read_as(Dimension::Pressure, DecimalStyle::Point));
            let found: Result<Vec<Interval>, _> =
                parsed.map(|values| values.into_iter().map(|parsed| parsed.quantity.interval).collect());
            prop_assert_eq!(found, Ok(intervals), "{}", text);
        }
    }

    #[test]
    fn a_list_with_a_part_that_is_no_value_gives_none(
        interval in interval(),
        wrong in select(vec!["4.5.6", "5 wekks", "1/2", "4.6 1)", "4.6 4.7", "1.2e3.4"]),
        first in any::<bool>(),
    ) {
        let value = format_interval(interval, Unit::Pascal);
        let text = if first { format!("{wrong}; {value}") } else { format!("{value}; {wrong}") };
        let parsed = parse_quantities(&text, read_as(Dimension::Pressure, DecimalStyle::Point));
        prop_assert!(parsed.is_err(), "{text} {parsed:?}");
    }

    #[test]
    fn no_mixture_of_known_words_panics(
        words in proptest::collection::vec(select(VOCABULARY.split('|').collect::<Vec<_>>()), 0..16),
        spaced in any::<bool>(),
        logarithm in any::<bool>(),
    ) {
        let text = words.join(if spaced { " " } else { "" });
        let scale = if logarithm { Scale::Logarithm } else { Scale::Linear };
        for dimension in DIMENSIONS {
            let read = ReadAs { scale, ..read_as(dimension, DecimalStyle::Point) };
            if let Ok(values) = parse_quantities(&text, read) {
                prop_assert!((1..=20).contains(&values.len()), "{text}");
                for parsed in values {
                    let interval = parsed.quantity.interval;
                    prop_assert!([interval.low(), interval.high()].iter().all(|end| end.number().is_none_or(f64::is_finite)));
                }
            }
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
