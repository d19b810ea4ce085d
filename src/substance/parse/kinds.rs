//! Words for what a row describes and for types of substance, in the eight languages.

use std::collections::BTreeSet;
use std::sync::LazyLock;

use regex::Regex;

use super::cell;
use super::pattern::fixed;
use crate::fault::CellFaultKind;
use crate::quantity::plain_words;
use crate::substance::{RowType, SubstanceType};
use crate::workbook::CellContent;

/// Starts of words, folded by `plain_words`; behind a star, parts of words.
const TYPE_WORDS: [(SubstanceType, &str); 10] = [
    (SubstanceType::Uvcb, "*uvcb|unknown or variable|unbekannte oder variable"),
    (
        SubstanceType::MultiConstituent,
        concat!(
            "multi constituent|multiconstituent|mehrkomponentenstoff|multikonstituent|mehrere bestandteile|",
            "multiconstituant|multi constituant|multicomponent|multi component|multicostituent|multi costituent|",
            "meerdere bestanddelen|meervoudige|多成分|多组分|多組分|多成份"
        ),
    ),
    (SubstanceType::Polymer, "*polymer|*polimer|*polymeer|ポリマー|高分子|重合体|聚合物"),
    (
        SubstanceType::Mixture,
        concat!(
            "mixture|*gemisch|*mischung|zubereitung|preparation|melange|mezcla|miscela|mengsel|preparado|preparato|",
            "preparaat|混合物|调和|調合品|制剂"
        ),
    ),
    (
        SubstanceType::Organometallic,
        concat!(
            "organometal|organo metal|metal organic|metalorganic|organotin|organozinn|zinnorgan|metallorganisch|",
            "organometaal|metaalorganisch|metallorganic|有機金属|有機金屬|有机金属|有機スズ|有机锡"
        ),
    ),
    (
        SubstanceType::Surfactant,
        concat!(
            "surfactant|surface active|*tensid|tensioacti|tensio acti|tensioatt|agent de surface|oppervlakteactie|",
            "界面活性|表面活性"
        ),
    ),
    (
        SubstanceType::OrganicSalt,
        concat!(
            "organic salt|salt of an organic|organisches salz|sel organique|sal organica|sale organico|",
            "organisch zout|有機塩|有機鹽|有机盐"
        ),
    ),
    (
        SubstanceType::Perfluoroalkyl,
        "pfas|perfluor|per fluor|per and polyfluor|polyfluor|per und polyfluor|有機フッ素|全氟|多氟|氟化烷",
    ),
    (
        SubstanceType::Ionisable,
        "ionisable|ionizable|ionisier|ionizzabil|ioniseer|イオン化|イオン性|可电离|可電離|可离子化",
    ),
    (
        SubstanceType::Inorganic,
        "inorganic|anorgan|inorganique|inorganico|inorganica|mineral|無機|无机|無機物",
    ),
];

const ORGANIC_WORDS: &str = "organic|organisch|organique|有機|有机";

/// Whole cells: a compound of a metal may be organic.
const METALS: [&str; 9] =
    ["metal", "metals", "metall", "metalle", "metallo", "metaal", "metalli", "金属", "金屬"];

/// Words that name a type of which nothing follows here.
const NO_TYPE: &str = concat!(
    "substance|stoff|sustancia|sostanza|stof|物質|物质|mono constituent|monoconstituent|einkomponentenstoff|",
    "monoconstituant|mono constituant|monocomponente|monocostituente|mono constituent substance|单组分|単一成分|other|",
    "others|sonstige|sonstiges|andere|autre|autres|otro|otros|otra|otras|altro|altri|altra|overig|overige|anders|",
    "その他|其他"
);

const TYPES_IN_WORDS: &str = concat!(
    "`organic`, `inorganic`, `organometallic`, `polymer`, `UVCB`, `multi-constituent`, `mixture`, `surfactant`, ",
    "`organic salt`, `PFAS`, `ionisable`, `other`"
);

const ROW_WORDS: [(RowType, &str); 3] = [
    (
        RowType::Mixture,
        concat!(
            "mixture|*gemisch|*mischung|zubereitung|preparation|formulation|formulierung|rezeptur|melange|mezcla|",
            "preparado|formulacion|miscela|preparato|formulazione|mengsel|preparaat|formulering|混合物|調合品|調剤|制剂|製剤|",
            "配方|配合物"
        ),
    ),
    (
        RowType::Article,
        "article|erzeugnis|artikel|objet|articulo|articolo|voorwerp|成形品|物品|アーティクル|製品",
    ),
    (
        RowType::Substance,
        concat!(
            "substance|*stoff|component|komponente|ingredient|chemical|chemikalie|composant|constituant|sustancia|",
            "sostanza|stof|componente|bestanddeel|bestandteil|物質|物质|成分|化学品"
        ),
    ),
];

const ROW_TYPES_IN_WORDS: &str = "`substance`, `mixture`, `article`";

/// `non-ionic` is a type of its own and denies nothing.
static NON_IONIC: LazyLock<Regex> = LazyLock::new(|| {
    fixed(
        r"\b(non|nicht|no|niet) ?(ionic|ionisch\w*|ionique|ionico|ionica|ionogen\w*)\b|非イオン(性|系)?|非离子|非離子",
    )
});
static DENIED: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r"\b(no|not|non|without|free|nicht|kein\w*|ohne|frei|pas|sans|sin|senza|geen|niet|zonder|aucun\w*|ningun\w*|",
        r"nessun\w*|vrij)\b|[非不]|ではない|でない|以外|なし|無し|无(聚|表|机金)"
    ))
});
/// Two types between which the cell does not decide.
static EITHER: LazyLock<Regex> = LazyLock::new(|| fixed(r"\b(or|oder|ou|either|o|oppure)\b|または|或"));

/// Whether one of the words stands in the folded text.
fn names(plain: &str, words: &str) -> bool {
    let padded = format!(" {plain}");
    words.split('|').any(|word| match word.strip_prefix('*') {
        Some(part) => plain.contains(part),
        None if word.is_ascii() => padded.contains(&format!(" {word}")),
        None => plain.contains(word),
    })
}

/// The type of substance a cell names, and further ones, which warn as well.
pub(super) fn read_substance_type(
    content: &CellContent,
) -> Result<Option<(SubstanceType, BTreeSet<SubstanceType>)>, CellFaultKind> {
    let Some(text) = cell::value_text(content) else {
        return Ok(None);
    };
    let unknown = CellFaultKind::NotOneOf { what: "substance type", words: TYPES_IN_WORDS };
    let plain = plain_words(&text);
    if NO_TYPE.split('|').any(|word| word == plain) {
        return Ok(None);
    }
    let types = types_in(&NON_IONIC.replace_all(&plain, " "));
    let denied = DENIED.is_match(&NON_IONIC.replace_all(&plain, " "));
    let named = types.len() + usize::from(names(&plain, ORGANIC_WORDS));
    if denied || (EITHER.is_match(&plain) && named > 1 && !plain.contains("unknown or variable")) {
        return Err(unknown);
    }
    let mut types = types.into_iter();
    match types.next() {
        Some(first) => Ok(Some((first, types.collect()))),
        None => Err(unknown),
    }
}

/// The types in the order of the table. Beside another one, `organic` says nothing more and `inorganic` is not believed,
/// because it would take the substance out of some instruments.
fn types_in(plain: &str) -> Vec<SubstanceType> {
    let mut types: Vec<SubstanceType> =
        TYPE_WORDS.iter().filter(|(_, words)| names(plain, words)).map(|(kind, _)| *kind).collect();
    if METALS.contains(&plain) {
        types.push(SubstanceType::Inorganic);
    }
    if names(plain, ORGANIC_WORDS) {
        types.push(SubstanceType::Organic);
    }
    let is_plain = |kind: &SubstanceType| matches!(kind, SubstanceType::Organic | SubstanceType::Inorganic);
    if types.iter().any(|kind| !is_plain(kind)) {
        types.retain(|kind| !is_plain(kind));
    } else if types.contains(&SubstanceType::Organic) {
        // A hybrid is organic as well, and so inside the instruments.
        types.retain(|kind| *kind == SubstanceType::Organic);
    }
    types
}

/// What a cell says the row describes.
pub(super) fn read_row_type(content: &CellContent) -> Result<Option<RowType>, CellFaultKind> {
    let Some(text) = cell::value_text(content) else {
        return Ok(None);
    };
    let plain = plain_words(&text);
    let mut found = ROW_WORDS.iter().filter(|(_, words)| names(&plain, words)).map(|(row_type, _)| *row_type);
    let unknown = CellFaultKind::NotOneOf { what: "row type", words: ROW_TYPES_IN_WORDS };
    match (found.next(), found.next()) {
        (Some(_), Some(_)) if EITHER.is_match(&plain) => Err(unknown),
        (Some(row_type), _) if !DENIED.is_match(&plain) => Ok(Some(row_type)),
        (Some(_) | None, _) => Err(unknown),
    }
}
