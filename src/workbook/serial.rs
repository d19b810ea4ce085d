//! Dates as the serial numbers of spreadsheets.

use crate::quantity::Date;

/// Days from the beginning of the 1900 system to that of the 1904 system (ECMA-376 part 1, 18.17.4.1).
pub(super) const DAYS_1900_TO_1904: f64 = 1462.0;

/// The serial number (1900 system) of a date written as `2026-12-01` or `2026-12-01T08:30:00`, from March 1900 on.
pub(super) fn serial_of(text: &str) -> Option<f64> {
    let (day, time) = text.split_once('T').unwrap_or((text, "00:00:00"));
    let date = Date::parse(day)?;
    let days = f64::from(days_since_1899(date)?);
    let mut fields = time.trim_end_matches('Z').split(':');
    let mut field = |largest: f64| {
        fields
            .next()
            .map_or(Some(0.0), |field| field.parse::<f64>().ok())
            .filter(|value| (0.0..largest).contains(value))
    };
    let seconds = field(24.0)? * 3600.0 + field(60.0)? * 60.0 + field(60.0)?;
    Some(days + seconds / 86_400.0)
}

/// Days since 30 December 1899, which is day 0 for every date from 1 March 1900 on.
fn days_since_1899(date: Date) -> Option<i32> {
    let (year, month, day) = date.parts();
    if (year, month) < (1900, 3) {
        return None;
    }
    // Years begin in March, so that a leap day is the last of its year.
    let (year, month) = if month < 3 {
        (i32::from(year) - 1, i32::from(month) + 9)
    } else {
        (i32::from(year), i32::from(month) - 3)
    };
    let days = 365 * year + year / 4 - year / 100 + year / 400 + (153 * month + 2) / 5 + i32::from(day) - 1;
    // 693,899 is what the line above gives for 30 December 1899.
    Some(days - 693_899)
}

#[cfg(test)]
mod tests {
    use super::serial_of;
    use crate::quantity::Date;

    #[test]
    fn a_date_in_words_of_the_standard_is_the_serial_of_its_day() {
        for day in ["1900-03-01", "1999-12-31", "2000-02-29", "2026-12-01"] {
            let serial = serial_of(day).unwrap();
            assert_eq!(Date::from_serial(serial).unwrap().to_string(), day);
        }
        assert_eq!(serial_of("2026-12-01T12:00:00"), serial_of("2026-12-01").map(|day| day + 0.5));
        assert_eq!(serial_of("2026-12-01T25:00:00"), None);
        assert_eq!(serial_of("tomorrow"), None);
    }
}
