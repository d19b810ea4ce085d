//! Calendar dates: a rulebook's edition, the day of a run.

/// A calendar day.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub struct Date(jiff::civil::Date);

impl Date {
    /// The day, if the calendar has it.
    pub fn new(year: i16, month: i8, day: i8) -> Option<Self> {
        jiff::civil::Date::new(year, month, day).ok().map(Self)
    }

    /// The day written as `2026-12-01`.
    pub fn parse(text: &str) -> Option<Self> {
        let mut parts = text.split('-');
        let year = parts.next()?.parse().ok()?;
        let month = parts.next()?.parse().ok()?;
        let day = parts.next()?.parse().ok()?;
        if parts.next().is_some() { None } else { Self::new(year, month, day) }
    }

    /// Today, by the system's clock and time zone.
    pub fn today() -> Self {
        Self(jiff::Zoned::now().date())
    }

    /// Year, month and day.
    pub fn parts(self) -> (i16, i8, i8) {
        (self.0.year(), self.0.month(), self.0.day())
    }

    /// The day a spreadsheet's serial number stands for (1900 system).
    pub fn from_serial(serial: f64) -> Option<Self> {
        if !(1.0..2_958_466.0).contains(&serial) {
            return None;
        }
        // The 1900 system counts a 29 February 1900 that never was; from March on, day 0 is 30 December 1899.
        let base =
            if serial < 60.0 { jiff::civil::date(1899, 12, 31) } else { jiff::civil::date(1899, 12, 30) };
        #[expect(
            clippy::cast_possible_truncation,
            reason = "bounded just above to the calendar of spreadsheets"
        )]
        let days = serial.floor() as i64;
        base.checked_add(jiff::Span::new().days(days)).ok().map(Self)
    }
}

impl std::fmt::Display for Date {
    fn fmt(&self, formatter: &mut std::fmt::Formatter<'_>) -> std::fmt::Result {
        write!(formatter, "{:04}-{:02}-{:02}", self.0.year(), self.0.month(), self.0.day())
    }
}

#[cfg(test)]
mod tests {
    use super::Date;

    #[test]
    fn a_spreadsheet_serial_is_the_day_it_shows() {
        assert_eq!(Date::from_serial(1.0), Date::new(1900, 1, 1));
        assert_eq!(Date::from_serial(61.0), Date::new(1900, 3, 1));
        assert_eq!(Date::from_serial(6607.0), Date::new(1918, 2, 1));
        assert_eq!(Date::from_serial(0.0), None);
    }

    #[test]
    fn a_day_the_calendar_lacks_is_refused() {
        assert_eq!(Date::parse("2023-02-30"), None);
        assert_eq!(Date::parse("2023-03-31").map(|date| date.to_string()).as_deref(), Some("2023-03-31"));
    }
}
