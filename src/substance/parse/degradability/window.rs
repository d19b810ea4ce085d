//! Phrases on the 10-day window, which neither pass nor fail the test, in the eight languages.

use std::sync::LazyLock;

use regex::Regex;

use crate::substance::parse::pattern::fixed;

/// In folded words, with `¦` where the text had a comma, bracket or colon.
static WINDOW: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        // What leads to it.
        r"(?:\b(?:but|aber|mais|pero|ma|maar) )?(?:\b(?:fail\w*|(?:not |nicht )?(?:meet\w*|fulfill\w*|pass\w*)|without|with|",
        r"ohne|mit|within|in|sans|avec|dans|sin|con|dentro|en|senza|entro|zonder|met|binnen|criter\w+|kriterium) )*",
        r"(?:\b(?:the|das|dem|des|la|le|de|della|del|of|van|het|een) )*",
        r"(?:(?:未能?|不|没有|沒有)?(?:满足|滿足|通过|通過|达到|達到|符合) ?)?",
        // The window.
        r"(?:\b10 ?(?:d|days?|tage?s?|tagen|jours?|dias?|giorni|dagen)? ?(?:window|zeitfenster|fenster|tijdvenster|venster|",
        r"dagenvenster|tagefenster)\b|\b(?:window|fenetre|ventana|finestra|tijdvenster|venster)(?: (?:of|de|di|van))? 10 ?",
        r"(?:days?|jours?|dias?|giorni|dagen)\b|10 ?(?:日間?|天)の?(?:間の)?(?:ウィンドウ|ウインドウ|窗口期?|窗口|观察期|觀察期))",
        // What is said of it.
        r"(?: ¦)?(?: (?:criter\w+|kriterium|criterium|is|was|wurde|war|est|es|fue|e|wordt))*",
        r"(?: (?:not |nicht |non |no |niet |pas )?(?:met|fail\w*|fulfilled|passed|satisfied|erfullt|eingehalten|bestanden|",
        r"respectee?|satisfaite?|remplie?|atteinte?|cumplid[ao]|superad[ao]|alcanzad[ao]|rispettat[ao]|soddisfatt[ao]|",
        r"superat[ao]|raggiunt[ao]|gehaald|voldaan|behaald|yes|no|ja|nein|oui|non|si|nee)\b)?",
        r"(?:[をはが]? ?(?:不適合|不合格|適合|合格|満たす|満たさない|未达到|未满足|不满足|满足|达到|未滿足|不滿足|滿足))?"
    ))
});
/// In the text as written, so that its days are not those of the test.
static WINDOW_AS_WRITTEN: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r"10\s*-?\s*(?:d|days?|tages?|tagen|jours?|d[ií]as?|giorni|dagen|日間?|天)\s*-?\s*の?(?:window|zeitfenster|fenster|",
        r"tijdvenster|venster|ウィンドウ|ウインドウ|窗口|观察|觀察)|",
        r"(?:window|fen[eê]tre|ventana|finestra|venster)\s(?:of|de|di|van)\s10\s(?:days?|jours?|d[ií]as?|giorni|dagen)"
    ))
});

/// Folded words without the window and what is said of it.
pub(super) fn without_window(folded: &str) -> String {
    WINDOW.replace_all(folded, " ").into_owned()
}

/// A text as written without the window.
pub(super) fn without_window_as_written(text: &str) -> String {
    WINDOW_AS_WRITTEN.replace_all(text, " ").into_owned()
}
