//! Words where a number or structure is asked for: that there is none to be had, or that the row is a mixture.

use std::sync::LazyLock;

use regex::Regex;

use crate::quantity::plain_words;
use crate::substance::parse::pattern::fixed;

/// What a word in an identity cell comes to.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(super) enum Absent {
    /// No number is given, for a reason that is no mistake.
    Withheld,
    /// The row holds several substances.
    Mixture,
}

// These look at words folded by `plain_words`, in the eight languages.
static WITHHELD: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r"\b(proprietary|confidential\w*|cbi|trade secrets?|secret|undisclosed|withheld|not (assigned|disclosed|listed|",
        r"registered|required)|unassigned|exempt(ed)?|polymer\w*|no (cas|ec|einecs|number|reg\w*)|without (cas|ec)|",
        r"propriet\w*|vertraulich\w*|betriebsgeheimnis\w*|geschaftsgeheimnis\w*|geheim|nicht (vergeben|zugeteilt|",
        r"zugewiesen|gelistet|offengelegt|vorhanden)|keine? (cas|ec|eg|einecs|nummer|nr)|ohne (cas|ec|eg)|",
        r"confidentiel\w*|secrets? (commercial|industriel|de fabrication)|non (attribue|communique|divulgue)e?|",
        r"(pas de|sans|aucun) (numero|n|cas|ce|ec)|confidencial\w*|secreto (comercial|industrial)|no asignado|",
        r"sin (cas|ce|ec|numero|asignar)|riservat\w*|segreto (commerciale|industriale)|non assegnato|",
        r"senza (cas|ce|ec|numero)|vertrouwelijk\w*|bedrijfsgeheim\w*|handelsgeheim\w*|niet toegekend|",
        r"(geen|zonder) (cas|ec|eg|nummer))\b|非公開|非開示|企業秘密|営業秘密|秘密|機密|保密|机密|商业秘密|商業秘密|",
        r"未公开|未分配|(cas|ec|番号|号)(番号|号|登録番号)?(なし|無し|無)|[无無](cas|ec)"
    ))
});
static SEVERAL: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r"\b(mixtures?|mix|preparation|formulation|blend|\w*gemisch\w*|\w*mischung\w*|zubereitung\w*|formulierung\w*|",
        r"melanges?|mezclas?|miscel[ae]|miscugli\w*|mengsels?|preparado|preparato|preparaat)\b|混合物|調合|配合|制剂"
    ))
});
static SEVERAL_ALONE: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r"^(various|several|multiple|many|diverse?|verschiedene|mehrere|divers|plusieurs|varios|varias|diversos|vari|",
        r"varie|diversi|diversen|meerdere|verscheidene|多种|多種|多个|複数|各種)$"
    ))
});
/// A mixture of isomers may have a number of its own.
static ISOMERS: LazyLock<Regex> = LazyLock::new(|| fixed(r"isom[eèé]r|異性体|异构"));

/// Words by which the number beside them is that of another substance, or perhaps of none, in folded words. `No.` and
/// `non` are left out: `CAS No.`, `non-ionic`.
static OF_ANOTHER: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r"\b(not|similar\w*|resembl\w*|analog\w*|homolog\w*|related|cf|compare|read across|surrogate|close to|",
        r"see|replac\w*|substitut\w*|supersed\w*|instead|formerly|former|previous\w*|deleted|obsolete|old|",
        r"impurit\w*|contain(?:s|ed|ing)?|salts? of|esters? of|derivatives?|derived|precursor|probabl[ye]|perhaps|maybe|",
        r"possibly|presumabl[ye]|unsure|uncertain|tentative|",
        r"nicht|kein\w*|ahnlich\w*|verwandt\w*|vgl|vergleiche|siehe|ersetzt|ersatz\w*|statt|fruher\w*|ehemals|ehem|",
        r"vormals|alte?|verunreinigung\w*|enthalt\w*|salze? (?:von|der|des)|derivate?|vermutlich|wahrscheinlich|evtl|",
        r"eventuell|vielleicht|unsicher|",
        r"pas|similaires?|apparente|voir|remplac\w*|ancien\w*|impuretes?|contient|contenant|sels? d[eu]|derives? d[eu]|",
        r"probablement|peut etre|no es|parecid[oa]|vease|ver|reemplaz\w*|sustitu\w*|anterior\w*|antigu[oa]|impurezas?|",
        r"contiene|sal(?:es)? de|derivad[oa]|quizas?|tal vez|non e|simil[ei]|vedi|sostitu\w*|precedente\w*|ex|",
        r"sal[ei] d\w+|derivat[oi]|forse|probabil\w*|niet|geen|vergelijkbaar|gelijkaardig|soortgelijk|zie|vervang\w*|",
        r"voorheen|vroeger|onzuiverhe\w*|verontreiniging\w*|bevat|zout van|waarschijnlijk|misschien)\b|",
        r"(類似|類縁|関連|参照|代替|代わり|不純物|含[有むま]?|旧|以前|ではない|でない|誘導体|おそらく|类似|相似|同系|参见|见|",
        r"替代|取代|杂质|雜質|包含|原|曾用|不是|并非|非|衍生|可能|疑似)"
    ))
});

/// What says of the number in a text that it is that of another substance: `not 67-64-1`, `salt of 67-64-1`, `67-64-1?`.
pub(super) fn word_of_another(text: &str) -> Option<String> {
    if text.contains(['?', '？']) {
        return Some("?".to_owned());
    }
    let plain = plain_words(text);
    OF_ANOTHER.find(&plain).map(|found| found.as_str().to_owned())
}

/// What a cell without a single digit says; `None` where it is something else, such as a name.
pub(super) fn absence(text: &str) -> Option<Absent> {
    let plain = plain_words(text);
    if text.contains(char::is_numeric) {
        None
    } else if SEVERAL.is_match(&plain) && !ISOMERS.is_match(&plain) && !WITHHELD.is_match(&plain)
        || SEVERAL_ALONE.is_match(&plain)
    {
        Some(Absent::Mixture)
    } else {
        WITHHELD.is_match(&plain).then_some(Absent::Withheld)
    }
}

/// Whether the words beside a number say that it is one of several.
pub(super) fn says_mixture(text: &str) -> bool {
    let plain = plain_words(text);
    SEVERAL.is_match(&plain) && !ISOMERS.is_match(&plain)
}
