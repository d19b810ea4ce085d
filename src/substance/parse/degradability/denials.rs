//! Words that deny, doubt or limit a result on biodegradation, in the eight languages.

use std::sync::LazyLock;

use regex::Regex;

use crate::substance::parse::pattern::fixed;

// These look at words folded by `plain_words`.

/// Any word of denial: beside it a word for ready is not believed.
static DENIAL: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r"\b(no|not|non|never|neither|nor|cannot|without|unlikely|negative?|false|isn|doesn|nicht|kein\w*|nein|weder|ohne|",
        r"negativ|falsch|kaum|niemals|pas|ne|sans|aucun\w*|jamais|ni|negatif|faux|sin|ningun\w*|nunca|negativo|falso|senza|",
        r"nessun\w*|mai|ne|niet|geen|zonder|nooit|nee|negatief|onwaar|invalid\w*|ungultig\w*|ongeldig\w*|fail\w*|",
        r"hardly|barely|scarcely)\b|[不非難难無无未否沒没]|ない|なし|ません|いいえ|ず(?: |$)"
    ))
});
/// A result with a changed inoculum, without air or of the first step only is none on ready biodegradability (OECD 301).
static OTHER_CONDITIONS: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r"\b(after|with|nach|mit|apres|avec|tras|con|dopo|na|met) (\w+ )?(adapt\w*|acclimat\w*|preadapt\w*|akklimat\w*|",
        r"pre exposed|aclimat\w*|adatta\w*)\b|\b(pre ?)?adapted\b|\badaptiert\w*|\badapte[es]?\b|\badaptad[oa]\b|\badattat[oa]\b|",
        r"\bgeadapteerd\b|\bacclimate[ds]?\b|馴化|順化|驯化|\banaerob\w*|嫌気|厌氧|厭氧|\bprim(ary|ar\w*|aer\w*|aire|air|ari[oa])\b|",
        r"一次分解|一次生分解|初级|初級"
    ))
});
/// What says that the inoculum was not changed, or numbers a guideline.
static HARMLESS: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r"\b(?:not|non|nicht|no|niet|without|ohne|sans|sin|senza|zonder|un|keine) ?(?:pre ?)?(?:adapt\w*|acclimat\w*|akklimat\w*|",
        r"adatta\w*|aclimat\w*|geadapteerd)\b|\bunadapted\b|\bunacclimated\b|未驯化|未馴化|非馴化|",
        r"\b(?:oecd|ocde|ocse|oeso|tg|test|guideline|method|iso)(?: tg| test| guideline)? (?:no|nr|n) "
    ))
});
/// With one of these, a word for ready is no result: `expected to be readily biodegradable`.
static UNCERTAIN: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r"\b(unknown|unbekannt|unclear|unklar|untested|pending|planned|geplant|ongoing|laufend|",
        r"expected|erwartet|likely|wahrscheinlich|probably|vermutlich|possibly|moglicherweise|may|might|could|",
        r"partially|partly|teilweise|if|unless|doubtful|fraglich|inconclusive|presumably|presumed|potentially|",
        r"probable\w*|vraisemblable\w*|suppose\w*|attendu\w*|peut etre|partiellement|devrait|pourrait|en cours|inconnu\w*|",
        r"esperad[oa]|supuest\w*|parcialmente|quizas?|podria|posible\w*|en curso|desconocid[oa]|",
        r"probabil\w*|previst[oa]|presum\w*|parzialmente|forse|potrebbe|possibil\w*|in corso|sconosciut[oa]|",
        r"waarschijnlijk\w*|vermoedelijk|verwacht\w*|gedeeltelijk|mogelijk\w*|onbekend|lopend)\b|",
        r"推定|推測|予測|可能性|おそらく|思われ|考えられ|一部|部分|可能|预计|预期|推测|估计|預計|預期|不明|未知|不详"
    ))
});
/// Nothing was found out, or not for good.
static NO_RESULT: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r"\b(no|not|keine?|nicht|ohne) (\w+ )?(data|information|results?|stud(y|ies)|tests?|tested|determined|conducted|performed|",
        r"available|assessed|investigated|known|daten|angaben?|informationen|ergebnis\w*|pruf\w*|gepruft|getestet|bestimmt|",
        r"untersucht|verfugbar|bekannt|bewertet)\b|",
        r"\b(unknown|unbekannt|untested|ungepruft|inconclusive|planned|geplant|pending|unclear|unklar|to be \w+)\b|",
        r"\b(non|pas|aucune?) (\w+ )?(teste\w*|determine\w*|evalue\w*|disponible\w*|etudie\w*|realise\w*|connue?s?|donnees?|",
        r"informations?|etudes?|essais?|resultats?)\b|",
        r"\b(no|sin|ningun\w*) (\w+ )?(ensay\w*|determinad\w*|evaluad\w*|disponible\w*|realizad\w*|conocid\w*|probad\w*|datos|",
        r"informacion|estudi\w*|resultad\w*)\b|",
        r"\b(non|nessun\w*|senza) (\w+ )?(testat\w*|determinat\w*|valutat\w*|disponibil\w*|eseguit\w*|not[oa]|dat[oi]|",
        r"informazion\w*|studi\w*|prov[ae]|risultat\w*)\b|",
        r"\b(niet|geen) (\w+ )?(getest|bepaald|beoordeeld|beschikbaar|onderzocht|bekend|uitgevoerd|gegevens|informatie|",
        r"onderzoek\w*|studies?|tests?|resultaten)\b|",
        r"未試験|未実施|試験なし|データなし|情報なし|未测试|未測試|未试验|未进行|无数据|無數據|无资料|不明|未知|不详"
    ))
});

pub(super) fn without_harmless(folded: &str) -> String {
    HARMLESS.replace_all(folded, " ").into_owned()
}

pub(super) fn denies(folded: &str) -> bool {
    DENIAL.is_match(folded)
}

pub(super) fn names_other_conditions(folded: &str) -> bool {
    OTHER_CONDITIONS.is_match(folded)
}

pub(super) fn is_uncertain(folded: &str) -> bool {
    UNCERTAIN.is_match(folded)
}

pub(super) fn says_no_result(folded: &str) -> bool {
    NO_RESULT.is_match(folded)
}
