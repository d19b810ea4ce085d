//! Lists of substances by CAS or EC number.

use crate::fault::RuleMistake;
use crate::rules::file::Section;
use crate::rules::{Listing, ListingEntry};
use crate::substance::{CasNumber, EcNumber};

/// The listings of a file, in order.
pub(super) fn read_listings(file: &Section<'_>) -> Vec<Listing> {
    file.sections("listing", "[[listing]]").iter().filter_map(read_listing).collect()
}

fn read_listing(section: &Section<'_>) -> Option<Listing> {
    section.allow(&["title", "source", "date", "cas", "ec"]);
    section.need("title = \"Stockholm Convention, Annex A\"");
    section.need("source = \"Decision SC-4/10\"");
    section.need("date = 2023-03-31");
    let (title, source, date) = (section.text("title"), section.text("source"), section.date("date"));
    let cas = read_numbers(section, "cas", |text| {
        CasNumber::parse(text).map(ListingEntry::Cas).map_err(|error| error.to_string())
    });
    let ec = read_numbers(section, "ec", |text| {
        EcNumber::parse(text).map(ListingEntry::Ec).map_err(|error| error.to_string())
    });
    if section.key_span("cas").is_none() && section.key_span("ec").is_none() {
        section.need("cas = [\"50-29-3\"]");
    }
    Some(Listing {
        title: title?.value,
        source: source?.value,
        date: date?.value,
        entries: [cas, ec].concat(),
    })
}

fn read_numbers(
    section: &Section<'_>,
    key: &str,
    parse: impl Fn(&str) -> Result<ListingEntry, String>,
) -> Vec<ListingEntry> {
    let texts = section.texts(key).unwrap_or_default();
    let read = |text: &crate::rules::file::Located<String>| match parse(&text.value) {
        Ok(entry) => Some(entry),
        Err(reason) => {
            let found = text.value.clone();
            section.report(text.span.clone(), RuleMistake::NotANumberOfASubstance { found, reason });
            None
        }
    };
    texts.iter().filter_map(read).collect()
}
