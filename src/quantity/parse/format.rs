//! Numbers and intervals as a reader writes them; what is written here reads back the same.

use crate::quantity::{Bound, Interval, Unit};

/// A number as a reader writes it: four significant digits, no trailing zeros, thousands not grouped; with a power of
/// ten (`1.2E-5`) below 0.001 and from 1,000,000,000 on.
pub fn format_number(number: f64) -> String {
    if !number.is_finite() || number.abs() < f64::MIN_POSITIVE {
        return if number.is_finite() { "0".to_owned() } else { number.to_string() };
    }
    let scientific = format!("{number:.3e}");
    let (mantissa, exponent) = scientific.split_once('e').unwrap_or((&scientific, "0"));
    let exponent: i32 = exponent.parse().unwrap_or(0);
    if !(-3..9).contains(&exponent) {
        return format!("{}E{exponent}", without_trailing_zeros(mantissa));
    }
    let rounded: f64 = scientific.parse().unwrap_or(number);
    let decimals = usize::try_from(3 - exponent).unwrap_or(0);
    without_trailing_zeros(&format!("{rounded:.decimals$}")).to_owned()
}

/// A number with every digit it has.
pub(super) fn number_in_full(number: f64) -> String {
    let size = number.abs();
    if size < f64::MIN_POSITIVE || (1e-5..1e15).contains(&size) {
        format!("{number}")
    } else {
        format!("{number:E}")
    }
}

fn without_trailing_zeros(decimal: &str) -> &str {
    if decimal.contains('.') { decimal.trim_end_matches('0').trim_end_matches('.') } else { decimal }
}

/// An interval as a reader writes it: `> 6.2`, `4.2–4.8`, `≤ 3 d`. The ends are in `unit`, as they are for the
/// canonical unit of a dimension.
pub fn format_interval(interval: Interval, unit: Unit) -> String {
    let (low, high) = (interval.low(), interval.high());
    let write = number_writer(interval);
    let value = match (low, high) {
        (Bound::Unbounded, Bound::Unbounded) => return "any value".to_owned(),
        (Bound::Included(low), Bound::Unbounded) => format!("≥ {}", write(low)),
        (Bound::Excluded(low), Bound::Unbounded) => format!("> {}", write(low)),
        (Bound::Unbounded, Bound::Included(high)) => format!("≤ {}", write(high)),
        (Bound::Unbounded, Bound::Excluded(high)) => format!("< {}", write(high)),
        (Bound::Included(low), Bound::Included(high)) if interval.single().is_some() => {
            let _ = high;
            write(low)
        }
        (Bound::Included(low), Bound::Included(high)) => format!("{}–{}", write(low), write(high)),
        (Bound::Excluded(low), Bound::Included(high)) => format!("> {} – {}", write(low), write(high)),
        (Bound::Included(low), Bound::Excluded(high)) => format!("{} – < {}", write(low), write(high)),
        (Bound::Excluded(low), Bound::Excluded(high)) => format!("> {} – < {}", write(low), write(high)),
    };
    if unit.symbol().is_empty() { value } else { format!("{value} {}", unit.symbol()) }
}

/// Four digits, unless they would make two different ends look the same.
fn number_writer(interval: Interval) -> fn(f64) -> String {
    match (interval.low().number(), interval.high().number()) {
        (Some(low), Some(high))
            if interval.single().is_none() && format_number(low) == format_number(high) =>
        {
            number_in_full
        }
        _ => format_number,
    }
}

#[cfg(test)]
mod tests {
    use super::{format_interval, format_number};
    use crate::quantity::{Bound, Interval, Unit};

    #[test]
    fn numbers_carry_four_digits_and_no_more() {
        for (number, written) in [
            (0.0, "0"),
            (4.5, "4.5"),
            (-4.0, "-4"),
            (1234.56, "1235"),
            (123_456.0, "123500"),
            (0.001, "0.001"),
            (0.001_234_56, "0.001235"),
            (0.000_999_96, "0.001"),
            (0.000_12, "1.2E-4"),
            (999_960_000.0, "1E9"),
            (999_900_000.0, "999900000"),
            (2.5e12, "2.5E12"),
        ] {
            assert_eq!(format_number(number), written);
        }
    }

    #[test]
    fn intervals_are_written_with_their_signs() {
        for (low, high, unit, written) in [
            (Bound::Excluded(6.2), Bound::Unbounded, Unit::One, "> 6.2"),
            (Bound::Included(4.2), Bound::Included(4.8), Unit::One, "4.2–4.8"),
            (Bound::Unbounded, Bound::Included(3.0), Unit::Day, "≤ 3 d"),
            (Bound::Excluded(1.0), Bound::Excluded(2.0), Unit::Day, "> 1 – < 2 d"),
            (Bound::Included(45.0), Bound::Included(45.0), Unit::Day, "45 d"),
        ] {
            assert_eq!(format_interval(Interval::new(low, high).unwrap(), unit), written);
        }
    }
}
