//! Words that say that a substance carries no hazard statement, in the eight languages.
//!
//! Whole cells only: `no data`, `not applicable` and `not classified due to lack of data` say no such thing.

use std::sync::LazyLock;

use regex::Regex;

use super::codes::codes_in;
use crate::quantity::plain_words;
use crate::substance::parse::pattern::fixed;

// These look at words folded by `plain_words`.
static NONE: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r"^(none|no|not classified|unclassified|not hazardous|non hazardous|no hazards?|no classification|not dangerous|",
        r"no (h|hazard) (statements?|phrases?|codes?)|keine?|keine? (h satze|einstufung|gefahrenhinweise|kennzeichnung|",
        r"gefahrstoff|gefahrlicher stoff)|nicht eingestuft|nicht klassifiziert|nicht kennzeichnungspflichtig|",
        r"kein gefahrstoff|ohne|nicht gefahrlich|not subject to classification|no labelling|",
        r"aucune?|neant|(non|pas) classee?|non dangereu(x|se)|(pas de|aucune|sans) (mentions? de danger|classification)|",
        r"ningun[oa]?|no clasificad[oa]|sin clasificar|no peligros[oa]|(ninguna|sin) (indicacion(es)? de peligro|",
        r"clasificacion)|nessun[oa]?|non classificat[oa]|non pericolos[oa]|(nessuna|senza) (indicazion[ei] di pericolo|",
        r"classificazione)|geen|niet (ingedeeld|geclassificeerd|gevaarlijk)|geen (gevarenaanduiding(en)?|indeling|h zinnen)|",
        r"なし|無し|無|区分に該当しない|区分外|无|没有|無分類|未分类|未分類|不分类|不分類|无分类|无危害|无危险性说明)",
        r"( (as|als) (hazardous|dangerous|gefahrlich\w*|gevaarlijk\w*).*|",
        r" (according|in accordance|under|nach|gemass|laut|im sinne|selon|segun|secondo|volgens) .*|",
        r" (comme|como|come) (dangereu\w*|peligros\w*|pericolos\w*).*|",
        r" (required|erforderlich|applicable))?$"
    ))
});
/// A classification that was not made is no word for none.
static NOT_ASSESSED: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r"\b(data|daten\w*|datenlage|lack\w*|insufficient|information|info|angaben?|mangels|fehlend\w*|unbekannt|unknown|known|",
        r"available|verfugbar|yet|noch|sds|possible|moglich|inconclusive|assessed|bewertet|pending|tested|gepruft|",
        r"donnees?|manque|insuffisant\w*|disponibles?|connu\w*|evalue\w*|encore|datos?|falta|insuficiente\w*|conocid\w*|",
        r"evaluad\w*|dati|mancanza|insufficient\w*|disponibil\w*|not[ao]|valutat\w*|gegevens|gebrek|onvoldoende|bekend\w*|",
        r"beoordeeld|nog)\b|数据|資料|资料|データ|情報|不明|評価|评估"
    ))
});

pub(super) fn says_none(text: &str) -> bool {
    let plain = plain_words(text);
    NONE.is_match(&plain) && !NOT_ASSESSED.is_match(&plain) && codes_in(text).0.is_empty()
}
