//! Texts that are a note, a footnote or the number of a printed page, in the eight languages.
//!
//! Names of substances begin with brackets, digits and asterisks too: `(1R)-...`, `[1,1'-biphenyl]-4-ol`, and lists mark
//! or number their substances: `* Toluene`, `2) Benzene`. So a mark alone makes no footnote; words must follow that no
//! name holds.

use std::sync::LazyLock;

use regex::Regex;

use super::pattern::fixed;
use crate::quantity::{is_missing, plain_words, tidy};

/// What a text beside the data is.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(super) enum Aside {
    Note,
    PageLabel,
}

/// Words before a colon that make what follows a note, in folded words.
static LABEL: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r"^(?:\d{1,2} ?)?(?:tables?|tabellen?|tableau|tabla|tabella|tabel|tab|annex|annexe|anhang|anlage|appendix|anexo|",
        r"allegato|bijlage|表|附表|別表|notes?|foot ?notes?|remarks?|comments?|sources?|references?|legend|key|abbreviations?|",
        r"disclaimer|date|printed|printed on|last update|last updated|status|open|to ?do|",
        r"anmerkung|anmerkungen|bemerkung|bemerkungen|hinweis|hinweise|fussnote|fussnoten|quelle|quellen|legende|",
        r"abkurzungen|stand|datum|gedruckt|gedruckt am|offen|noch offen|",
        r"remarque|remarques|nota bene|n b|legende|abreviations|date d edition|en attente|",
        r"notas?|observacion|observaciones|fuentes?|leyenda|abreviaturas|fecha|pendientes?|",
        r"osservazioni|osservazione|fonti|fonte|legenda|abbreviazioni|data|in sospeso|",
        r"opmerking|opmerkingen|toelichting|voetnoot|bron|bronnen|afkortingen|",
        r"注|註|注記|註記|注釈|注意|備考|出典|資料|資料来源|凡例|作成日|注释|說明|说明|备注|備註|来源|来源说明|數據來源|数据来源|图例|日期)",
        r" ?\d{0,2}[a-z]?$"
    ))
});

/// Words for notes that make a row one when they are all it says; `fonte` alone is cast iron.
static HEAD_OF_NOTES: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r"^(?:notes?|foot ?notes?|remarks?|abbreviations|anmerkung|anmerkungen|bemerkungen|hinweise|fussnoten|legende|",
        r"abkurzungen|remarque|remarques|notas?|observaciones|leyenda|abreviaturas|osservazioni|legenda|opmerking|",
        r"opmerkingen|toelichting|voetnoten|afkortingen|注|註|注記|備考|凡例|备注|備註|注释|说明)(?: ?\d{1,2})?$"
    ))
});

/// A numbered note without a colon: `Note 2.`, `注1）`.
static NUMBERED: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r"(?i)^[(（\[]?(?:(?:foot)?note|table|tabelle|tableau|tabla|tabella|tabel|表|anmerkung|fu(?:ß|ss)note|remarque|nota|opmerking|voetnoot|注記|備考|备注|備註|[注註])",
        r"\s?[0-9０-９]{1,2}\s?(?:[.)）、\]]|\p{Pd}\s)\s*\S"
    ))
});

/// What a footnote begins with.
static MARK: LazyLock<Regex> = LazyLock::new(|| {
    fixed(
        r"(?s)^(?:[(（]?\*{1,5}[)）]?|[†‡§#※＊]{1,3}|[¹²³⁰-⁹]{1,2}[)）⁾]?|[(（]?\d{1,2}[)）]|\[\d{1,2}\]|[(（]?[a-z][)）])\s*(?P<rest>\S.*)$",
    )
});

/// Words that say something, as no name does, anywhere in a text of folded words between spaces. Words of a name may
/// not be among them: `origin`, `average` and `unknown composition` stand in names.
static SAYS: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r" (?:is|are|was|were|see|unless|please|values?|data|determinations?|reported|refers|indicates|denotes|means|",
        r"according to|based on|(?:mean|average) of|confidential business|",
        r"siehe|ist|sind|wurde|wurden|wird|werden|gemass|laut|mittelwert|werte?|daten|angaben?|sofern|bitte|lieferant|",
        r"lieferanten|",
        r"voir|sont|selon|valeurs?|donnees|sauf|fournisseurs?|",
        r"vease|segun|valor|valores|datos|salvo|proveedor|proveedores|",
        r"vedi|secondo|valore|valori|dati|sono|fornitore|",
        r"zie|volgens|waarden?|gegevens|tenzij|zijn|wordt|worden|leverancier) "
    ))
});

/// Words that no name begins with; further on in a name they may stand, as in `lead compounds, calculated as Pb`. Left out
/// are `non`, `no`, `per` and `para`, with which names begin: `non-ionic`, `No. 2 fuel oil`, `para-xylene`.
static BEGINS: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r"^ (?:not|only|if|for|from|at|mean|average|measured|calculated|estimated|determined|assumed|",
        r"nicht|nur|bei|nach|fur|gemessen|berechnet|geschatzt|bestimmt|",
        r"pour|chez|seulement|moyenne|mesure|mesuree?s?|calcule|calculee?s?|estime|estimee?s?|determine|determinee?s?|",
        r"solamente|ver|media|promedio|medid[oa]s?|calculad[oa]s?|estimad[oa]s?|determinad[oa]s?|",
        r"misurat[oaie]|calcolat[oaie]|stimat[oaie]|determinat[oaie]|",
        r"alleen|voor|bij|niet|gemiddelde|gemeten|berekend|geschat|bepaald) "
    ))
});

/// Phrases of Japanese and Chinese notes.
static SAYS_IN_SIGNS: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r"[。]|です|ます|ください|参照|參照|場合|平均値|測定|推定|文献値|平均值|计算值|测定|估算|参见|參見|请|請|数据|數據|",
        r"根据|根據|表示|供应商|供應商"
    ))
});

/// What an abbreviation for a missing value is explained by.
static EXPLAINS: LazyLock<Regex> = LazyLock::new(|| {
    fixed(
        r" (?:not|no|non|none|nicht|keine?|ohne|sans|pas|aucune?|sin|senza|nessun|geen|niet|below|unter) |[不无無未]|なし",
    )
});

/// The end of a printed list, in folded words.
static END_OF_LIST: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r"^(?:end of (?:the )?(?:list|table|report|file|data)|ende der (?:liste|tabelle|datei|daten)|listenende|",
        r"fin de (?:la )?(?:liste|lista|tabla)|fin du (?:tableau|fichier)|fine (?:della |dell )?(?:lista|elenco|tabella)|",
        r"einde (?:van )?(?:de )?(?:lijst|tabel)|einde lijst|以上|列表结束|表终|リストの終わり|一覧終わり)$"
    ))
});

/// The number of a page, in folded words.
static PAGE: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r"^(?:(?:page|pages|pag|seite|blatt|pagina|hoja|blad|feuille|foglio)",
        r" ?\d{1,5}(?: ?(?:of|von|de|sur|di|van) ?\d{1,5}| \d{1,5})?|",
        r"(?:(?:ペーシ|ページ|頁|页) ?\d{1,5}|第 ?\d{1,5} ?(?:ページ|頁|页))(?: ?(?:全|共|总|of)? ?\d{1,5} ?(?:ページ|頁|页)?)?|",
        r"\d{1,5} (?:\d{1,5} ?)?(?:ページ|頁|页)|\d{1,5}(?:ページ|頁|页))$"
    ))
});

/// What a text beside the data is; `None` for what may be the name of a substance.
pub(super) fn aside_of(untidy: &str) -> Option<Aside> {
    let tidied = tidy(untidy);
    let text = tidied.trim();
    if text.len() <= 60 && PAGE.is_match(&plain_words(text)) {
        return Some(Aside::PageLabel);
    }
    // Tidied, a raised digit is no longer told from another.
    let marked = MARK.captures(untidy.trim()).and_then(|found| found.name("rest"));
    let is_note = is_labelled(text)
        || NUMBERED.is_match(text)
        || marked.is_some_and(|rest| follows_mark(&tidy(rest.as_str())));
    is_note.then_some(Aside::Note)
}

/// A label before a colon, an abbreviation explained, the head of notes or the end of a list.
fn is_labelled(text: &str) -> bool {
    const LONGEST: usize = 80;
    let short = |part: &str| part.len() <= LONGEST;
    let labelled = text
        .split_once([':', '：'])
        .is_some_and(|(label, _)| short(label) && LABEL.is_match(&plain_words(label)));
    let explained = text.split_once('=').is_some_and(|(word, rest)| {
        let word = word.trim();
        !word.is_empty() && is_missing(word) && EXPLAINS.is_match(&format!(" {} ", plain_words(rest)))
    });
    let alone = || {
        let words = plain_words(text);
        HEAD_OF_NOTES.is_match(&words) || END_OF_LIST.is_match(&words)
    };
    labelled || explained || (short(text) && alone())
}

/// Whether a text behind a mark is a note. Words are parted by spaces alone: `at-risk` does not begin with `at`.
fn follows_mark(rest: &str) -> bool {
    let words: String = rest
        .split_whitespace()
        .fold(" ".to_owned(), |words, word| words + &plain_words(word).replace(' ', "-") + " ");
    is_labelled(rest) || SAYS.is_match(&words) || BEGINS.is_match(&words) || SAYS_IN_SIGNS.is_match(rest)
}
