//! Hazard classes with their category, in the eight languages.

use std::sync::LazyLock;

use regex::Regex;

use crate::fault::CellFaultKind;
use crate::substance::parse::pattern::{fixed, fixed_by_parts};

/// Classes in folded words and the code of each category (Regulation (EC) No 1272/2008, Annex VI and, for the EUH
/// classes, as amended by Regulation (EU) 2023/707; common practice).
static CLASSES: LazyLock<Vec<Class>> = LazyLock::new(|| {
    vec![
        Class::new(
            concat!(
                r"(\b(?:carc\w*|karz\w*|krebserz\w*|cancerog\w*|cancerig\w*|carcinog\w*|kankerverwekk\w*)|",
                r"発がん性|発癌性|致癌性|致癌)"
            ),
            &[("1a", "H350"), ("1b", "H350"), ("1", "H350"), ("2", "H351")],
        ),
        Class::new(
            concat!(
                r"(\b(?:muta\w*|keimzellmut\w*)(?: (?:sur|en|in|nelle|sulle|auf|cellules|celulas|cellule|germinal\w*|",
                r"geslachtscell\w*|les|las|le|germ|cells?|keimzell\w*|germinali))*|(?:生殖細胞|生殖细胞)?(?:変異原性|致突变性|致突變性))"
            ),
            &[("1a", "H340"), ("1b", "H340"), ("1", "H340"), ("2", "H341")],
        ),
        Class::new(
            concat!(
                r"(\b(?:repr\w*(?: tox\w*)?|(?:toxic )?(?:for|to) reproduction|fortpfl\w*(?: \w+)?|(?:toxi\w*|tossic\w*) ",
                r"(?:pour|para|per) (?:la )?(?:repro\w*|ripro\w*)|voortplant\w*|giftig voor de voortplanting)|",
                r"生殖毒性)"
            ),
            &[("1a", "H360"), ("1b", "H360"), ("1", "H360"), ("2", "H361")],
        ),
        Class::new(
            concat!(
                r"(\b(?:stot|specific target organ tox\w*|spezifische zielorgan ?tox\w*|toxicite specifique pour certains ",
                r"organes cibles|toxicidad especifica en determinados organos|tossicita specifica per organi bersaglio|",
                r"specifieke doelorgaantoxiciteit) (?:re|rep\w*|wdh\w*|wiederholt\w*|exposition repetee|exposicion(?:es)? ",
                r"repetidas?|esposizione ripetuta|herhaalde)(?: exp\w*| blootstelling)?|",
                r"特定標的臓器毒性 ?(?:反復ばく露|反復暴露)|特异性靶器官(?:系统)?毒性 ?(?:反复接触|重复接触))"
            ),
            &[("1", "H372"), ("2", "H373")],
        ),
        Class::new(
            r"(\b(?:ed hh|endocrine disrupt\w*(?: for)? human health))",
            &[("1", "EUH380"), ("2", "EUH381")],
        ),
        Class::new(
            r"(\b(?:ed env|endocrine disrupt\w*(?: for)?(?: the)? environment))",
            &[("1", "EUH430"), ("2", "EUH431")],
        ),
        Class::new(r"(\baquatic acute)", &[("1", "H400")]),
        Class::new(r"(\baquatic chronic)", &[("1", "H410"), ("2", "H411"), ("3", "H412"), ("4", "H413")]),
    ]
});
/// `Cat. 2` of the three classes that the system before had with other numbers.
static OLD_CATEGORY: LazyLock<Regex> = LazyLock::new(|| fixed(r"\b((?:carc|muta?|repr)(?: tox)? cat 2)\b"));

struct Class {
    with_category: Regex,
    alone: Regex,
    codes: &'static [(&'static str, &'static str)],
}

impl Class {
    fn new(words: &'static str, codes: &'static [(&'static str, &'static str)]) -> Self {
        let with_category = format!(
            concat!(
                r"{}(?: ?(?:cat|category|kat|kategorie|categorie|categoria|class|klasse|区分|類別|类别|第))*",
                r" ?(1a|1b|[1-4])(?:[^0-9a-z]|$)"
            ),
            words
        );
        Self { with_category: fixed_by_parts(&with_category), alone: fixed_by_parts(words), codes }
    }
}

/// Adds the codes of the classes in folded words; gives back what is wrong with a class: that it stands without category
/// and its codes are not there, or that its category may be one of the old system.
pub(super) fn read_classes(plain: &str, codes: &mut Vec<String>) -> Option<CellFaultKind> {
    let mut fault = old_category(plain, codes);
    // Which of two codes it means is not known, so neither is read.
    let plain = if fault.is_some() { OLD_CATEGORY.replace_all(plain, " ") } else { plain.into() };
    for class in CLASSES.iter() {
        let mut found_category = false;
        for found in class.with_category.captures_iter(&plain) {
            let category = found.iter().flatten().last().map_or("", |part| part.as_str());
            let code = class.codes.iter().find(|(known, _)| *known == category).map(|(_, code)| *code);
            // A code of the same family in the cell says more: `Repr. 1B; H360FD`.
            if let Some(code) = code {
                found_category = true;
                if !codes.iter().any(|known| known.starts_with(code)) {
                    codes.push(code.to_owned());
                }
            }
        }
        let has_code = |code: &str| codes.iter().any(|known| known.starts_with(code));
        let explained = found_category || class.codes.iter().any(|(_, code)| has_code(code));
        if !explained && let Some(found) = class.alone.find(&plain) {
            let class = found.as_str().to_owned();
            fault.get_or_insert(CellFaultKind::ClassWithoutCategory { class });
        }
    }
    fault
}

/// The first such category whose code, of today's category 1 or 2, does not stand beside it.
fn old_category(plain: &str, codes: &[String]) -> Option<CellFaultKind> {
    let unexplained = |class: &&str| {
        let family = match class.get(..1) {
            Some("c") => ["H350", "H351"],
            Some("m") => ["H340", "H341"],
            Some(_) | None => ["H360", "H361"],
        };
        !codes.iter().any(|known| family.iter().any(|code| known.starts_with(code)))
    };
    let class = OLD_CATEGORY.find_iter(plain).map(|found| found.as_str()).find(unexplained)?;
    Some(CellFaultKind::OldCategory { class: class.to_owned() })
}
