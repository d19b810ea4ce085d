//! Words of a cell that name another quantity, organism or medium than its column asks for.
//!
//! A number beside such words does not stand for the column, however well it reads. The patterns look at folded words, in
//! English, German, French, Spanish, Italian, Dutch, Japanese and Chinese.

use std::sync::LazyLock;

use regex::Regex;

use super::pattern::{fixed, fixed_by_parts};
use super::remark::folded;
use crate::quantity::Dimension;
use crate::substance::{Compartment, Property};

/// What in the text of a cell speaks against its column, as far as words can tell.
pub(super) fn named_against(property: Property, header: &str, text: &str) -> Option<String> {
    if !text.contains(char::is_alphabetic) {
        return None;
    }
    let plain = folded(text);
    let found = match property {
        Property::LogKow => {
            first(&plain, &[&LOG_D, &LOG_KOA, &KOC, &BCF, &BAF, &BMF]).or_else(|| ionised(&plain))
        }
        Property::LogKoa => first(&plain, &[&LOG_D, &KOC]),
        Property::LogD => first(&plain, &[&LOG_KOA, &KOC]),
        Property::Bcf => first(&plain, &[&BAF, &BMF, &BSAF, &TMF, &TERRESTRIAL, &PLANT, &DRY_WEIGHT]),
        Property::Baf => first(&plain, &[&BCF, &BMF, &BSAF, &TMF, &TERRESTRIAL, &DRY_WEIGHT]),
        Property::Koc => first(&plain, &[&LOG_KOA, &BCF, &BAF]),
        Property::Bmf => first(&plain, &[&BCF, &BAF, &BSAF, &TMF]),
        Property::Tmf => first(&plain, &[&BCF, &BAF, &BSAF, &BMF]),
        Property::LongTermToxicity => first(&plain, &[&TERRESTRIAL, &ROUTE])
            .or_else(|| other_effect(&plain))
            .or_else(|| short_test(header, &plain)),
        Property::AcuteToxicity => first(&plain, &[&TERRESTRIAL, &ROUTE]),
        Property::HalfLife(compartment) => in_another_medium(compartment, &plain),
        Property::WaterSolubility
        | Property::MeltingPoint
        | Property::BoilingPoint
        | Property::VapourPressure
        | Property::HenryConstant
        | Property::PkaAcid
        | Property::PkaBase
        | Property::HydrolysisHalfLife
        | Property::PhotolysisHalfLife
        | Property::DissipationHalfLife
        | Property::MolarMass => None,
    };
    // `> water solubility (0.5 mg/L)`: with a sign before it, the name is that of a bound.
    let is_bound = text.trim_start().starts_with(['<', '>', '≤', '≥', '＜', '＞']);
    let lead = || if is_bound { None } else { named_first(property, &plain) };
    found.or_else(lead).map(str::to_owned)
}

/// Whether remarks beside a value that is no logarithm say that it is one, or give a logarithm that does not fit it.
pub(super) fn says_logarithm(remarks: &[String], value: Option<f64>) -> bool {
    static LOGARITHM: LazyLock<Regex> = LazyLock::new(|| {
        fixed(r"\b(?:log|lg)(?:10)? ?(?:k ?oc|bcf|baf|bmf|tmf)\b\D{0,4}(-?\d+(?:[.,]\d+)?)?")
    });
    const ROUNDED_BY: f64 = 0.1;
    remarks.iter().any(|remark| {
        let lower = remark.to_lowercase();
        LOGARITHM.captures(&lower).is_some_and(|found| {
            let beside =
                found.get(1).and_then(|number| number.as_str().replace(',', ".").parse::<f64>().ok());
            let fits =
                beside.zip(value).is_some_and(|(log, value)| (value.log10() - log).abs() <= ROUNDED_BY);
            !fits
        })
    })
}

/// Whether a remark names the log Kow, which may be what was measured where another value is asked for.
pub(super) fn names_log_kow(remarks: &[String]) -> bool {
    static LOG_KOW: LazyLock<Regex> =
        LazyLock::new(|| fixed(r"\b(?:log|lg) ?(?:k ?ow|p ?ow|p)\b|\bk ?ow\b|\bp ?ow\b"));
    remarks.iter().any(|remark| LOG_KOW.is_match(&folded(remark)))
}

fn first<'text>(plain: &'text str, patterns: &[&LazyLock<Regex>]) -> Option<&'text str> {
    patterns.iter().find_map(|pattern| pattern.find(plain)).map(|found| found.as_str().trim())
}

static LOG_D: LazyLock<Regex> = LazyLock::new(|| {
    fixed(
        r"\b(?:log|lg) ?d(?: ?ow| ?oct\w*)?\b|\bd ?ow\b|\bdistribution (?:ratio|coefficient)\b|分布比|分配比",
    )
});
static LOG_KOA: LazyLock<Regex> = LazyLock::new(|| {
    fixed(r"\b(?:log ?|lg ?)?k ?oa\b|\b(?:log ?|lg ?)k ?aw\b|\boctanol (?:air|luft)\b|\boktanol luft\b")
});
static KOC: LazyLock<Regex> = LazyLock::new(|| fixed(r"\b(?:log ?|lg ?)?k ?oc\b|\b(?:log ?|lg ?)kd\b"));
static BCF: LazyLock<Regex> = LazyLock::new(|| fixed(r"\b(?:log ?|lg ?)?bcf\w{0,2}\b"));
static BAF: LazyLock<Regex> = LazyLock::new(|| fixed(r"\b(?:log ?|lg ?)?baf\b"));
static BMF: LazyLock<Regex> = LazyLock::new(|| {
    fixed(r"\b(?:log ?|lg ?)?bmf\b|\bbiomagnif\w*|\bbiomagnificat\w*|生物拡大|経口濃縮|生物放大")
});
static BSAF: LazyLock<Regex> = LazyLock::new(|| fixed(r"\b(?:log ?|lg ?)?bsaf\b|\bbiota sediment\b"));
static TMF: LazyLock<Regex> = LazyLock::new(|| fixed(r"\b(?:log ?|lg ?)?tmf\b|\btrophic magnif\w*"));

/// Whose name a pattern is.
type IsNamed = fn(Property) -> bool;

/// The name of another value at the beginning, or as the only words behind a number: `log Kow 3` in a column of BCF.
fn named_first(property: Property, plain: &str) -> Option<&str> {
    static NAMES: LazyLock<Vec<(IsNamed, Regex)>> = LazyLock::new(|| {
        let names: [(IsNamed, &str); 9] = [
            (
                |property| property == Property::LogKow,
                r"(?:log10|log|lg) ?p|(?:(?:log10|log|lg) ?)?(?:k ?ow|p ?ow)",
            ),
            (|property| matches!(property, Property::PkaAcid | Property::PkaBase), r"pk[ab]\d?"),
            (|property| property == Property::Koc, r"(?:(?:log|lg) ?)?k ?oc"),
            (|property| matches!(property, Property::Bcf | Property::Baf), r"(?:(?:log|lg) ?)?(?:bcf|baf)"),
            (
                |property| property.dimension() == Dimension::Time,
                r"dt ?50|degt ?50|half ?life|t ?1 2|halbwertszeit|hwz|demi vie|vida media|emivita|halfwaardetijd|半減期|半衰期",
            ),
            (
                |property| property == Property::WaterSolubility,
                r"(?:water )?solubility|(?:wasser)?loslichkeit|solubilite|solubilidad|solubilita|oplosbaarheid|ws|溶解度",
            ),
            (
                |property| property == Property::VapourPressure,
                r"vp|vapou?r pressure|dampfdruck|蒸気圧|蒸气压",
            ),
            (
                |property| matches!(property, Property::LongTermToxicity | Property::AcuteToxicity),
                r"noec|noel|loec|e[rbcy]?c ?(?:10|20|50)|l[cd] ?50|ic ?50",
            ),
            (
                |property| {
                    matches!(property, Property::MeltingPoint | Property::BoilingPoint | Property::MolarMass)
                },
                r"mp|bp|mw|smp|sdp|kp|schmp|melting point|boiling point|schmelzpunkt|siedepunkt|molar mass|molmasse|molecular weight",
            ),
        ];
        let pattern = |names: &str| {
            format!(r"^(?:measured |exp |calc )?(?:{names})\b|^[\d ]+(?:l kg |mg l )?(?:{names})$")
        };
        names.into_iter().map(|(own, names)| (own, fixed_by_parts(&pattern(names)))).collect()
    });
    let others = NAMES.iter().filter(|(own, _)| !own(property));
    others.filter_map(|(_, names)| names.find(plain)).map(|found| found.as_str().trim()).next()
}

/// Animals of the land, whatever the route.
static TERRESTRIAL: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r"\b(?:rats?|ratten?|mouse|mice|maus|mause|muis|muizen|souris|raton(?:es)?|rat[ao]|ratas|ratt[oi]|top[oi]|rabbits?|kaninchen|",
        r"lapins?|conejos?|conigli[oi]?|konijn(?:en)?|dogs?|hund|hunde|mammals?|mammalian|saugetiere?|saugern?|mammiferes?|mamiferos?|",
        r"mammiferi|zoogdier(?:en)?|humans?|mensch\w*|earthworms?|regenwurm\w*|vers? de terre|lombri\w*|regenworm\w*|eisenia|lumbric\w*|",
        r"enchytrae\w*|collembol\w*|springtails?|folsomia|terrestrial|terrestrisch\w*|terrestres?|terrestri|landpflanzen?|",
        r"bees?|honeybees?|bienen?|honigbienen?|abeilles?|abejas?|ap[ei]|bijen?|apis|birds?|vogel\w*|oiseaux?|aves?|pajaros?|",
        r"uccell[oi]|avian|quails?|wachtel\w*|colinus|ducks?)\b|ラット|マウス|ウサギ|ミミズ|ミツバチ|鳥類|哺乳|大鼠|小鼠|家兔|蚯蚓|蜜蜂|鸟类|哺乳"
    ))
});
/// Aquatic and other plants, whose uptake is no bioconcentration in animals.
static PLANT: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r"\b(?:plants?|pflanzen?|plantes?|plantas?|piant[ae]|planten|lemna|duckweed|wasserlinsen?|macrophyt\w*|makrophyt\w*|",
        r"algae?|algal|algen?|grunalgen?|algues?|algas?|alghe|chlorella|scenedesmus|pseudokirchneriella|raphidocelis|desmodesmus)\b|",
        r"植物|藻"
    ))
});
static DRY_WEIGHT: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r"\b(?:dry (?:weight|wt|mass|basis)|dw|dwt|trockengewicht\w*|trockenmasse|poids sec|masse seche|peso seco|peso secco|",
        r"droog ?gewicht|drooggewicht)\b|乾燥重量|乾重|干重"
    ))
});
static ROUTE: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r"\b(?:oral|oraal|orale[rs]?|orally|gavage|dermal\w*|inhalation\w*|inhalativ\w*|inhalatie|inalazione|inhalacion|dietary|",
        r"soil|boden|suelo|suolo|bodem)\b|経口|経皮|吸入|经口|经皮|土壌|土壤"
    ))
});

/// Words for ions, unless they are denied: log Kow is of the neutral form.
fn ionised(plain: &str) -> Option<&str> {
    static DENIED: LazyLock<Regex> = LazyLock::new(|| {
        fixed(
            r"\b(?:non|not|un|nicht|no|niet) (?:dis)?(?:ioni\w*|geion\w*|dissoz\w*|dissoc\w*|disoc\w*)|\bneutral\w*|\bneutr[eo]\b|(?:非|未)\S{0,2}(?:解離|イオン|离子|離子|电离)|中性",
        )
    });
    static ION: LazyLock<Regex> = LazyLock::new(|| {
        fixed(concat!(
            r"\b(?:anion\w*|[ck]ation\w*|catione?s?|zwitterion\w*|ionised|ionized|ionisiert\w*|ionisee?s?|ionizad[ao]s?|ionizzat[oa]|",
            r"geioniseerd\w*|dissoziiert\w*|dissociated|dissociee?|disociad[ao]|dissociat[oa]|gedissocieerd\w*)\b|",
            r"陰イオン|陽イオン|イオン化|イオン形|解離形|解離型|阴离子|阳离子|离子形|离子态|电离"
        ))
    });
    if DENIED.is_match(plain) { None } else { first(plain, &[&ION]) }
}

/// Effects that are no NOEC or EC10; with a number of their own behind them they are another value beside it.
fn other_effect(plain: &str) -> Option<&str> {
    static EFFECT: LazyLock<Regex> =
        LazyLock::new(|| fixed(r"\b(?:loec|loel|loael|e[rbcy]?c ?(?:20|25|30)|ic ?(?:20|25))\b"));
    EFFECT.find_iter(plain).find_map(|found| {
        let after = plain
            .get(found.end()..)
            .unwrap_or_default()
            .trim_start_matches([' ', '=', ':', '<', '>', '≤', '≥']);
        let has_number = after.starts_with(|first: char| first.is_ascii_digit());
        (!has_number).then_some(found.as_str())
    })
}

/// A test of up to four days is long only for algae.
fn short_test<'text>(header: &str, plain: &'text str) -> Option<&'text str> {
    static HOURS: LazyLock<Regex> = LazyLock::new(|| {
        fixed(
            r"\b(?:24|48|96) ?(?:h|hrs?|hours?|std|stunden|heures?|horas?|ore|uur|uren)\b|\b(?:24|48|96) ?(?:時間|小时|小時)",
        )
    });
    static ALGAE: LazyLock<Regex> = LazyLock::new(|| {
        fixed(
            r"\b(?:alga\w*|algen?|algues?|alghe|grunalgen?|pseudokirch\w*|raphidocelis|desmodesmus|scenedesmus|chlorella|skeletonema|diatom\w*|oecd ?(?:tg ?)?201)\b|藻",
        )
    });
    let of_algae = ALGAE.is_match(plain) || ALGAE.is_match(&folded(header));
    if of_algae { None } else { first(plain, &[&HOURS]) }
}

static SOIL: LazyLock<Regex> = LazyLock::new(|| {
    fixed(r"\b(?:soils?|boden|bodens|boeden|sols?|suelos?|suol[oi]|bodem|grond|oecd (?:tg )?307)\b|土壌|土壤")
});
static SEDIMENT: LazyLock<Regex> = LazyLock::new(|| fixed(r"\bsediment\w*|底質|堆積物|沉积物|沉積物|底泥"));
static WATER: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r"\b(?:water|waters|freshwater|seawater|surface water|groundwater|wasser|susswasser|meerwasser|oberflachenwasser|grundwasser|",
        r"eaux?|aguas?|acqua|acque|zoetwater|zeewater|oppervlaktewater|grondwater|river|fluss|pond|lake|oecd (?:tg )?309)\b|",
        r"水中|海水|淡水|河川水|地表水|地下水|水体|^水$"
    ))
});
static AIR: LazyLock<Regex> = LazyLock::new(|| {
    fixed(r"\b(?:air|luft|aire|aria|lucht|atmospher\w*|atmosphar\w*|atmosfer\w*)\b|大気|空気|空气|大气")
});
static MARINE: LazyLock<Regex> = LazyLock::new(|| {
    fixed(
        r"\b(?:marine\w*|seawater|sea water|saltwater|salt water|meerwasser|marin\w*|salzwasser|eau de mer|agua de mar|acqua di mare|zeewater|mariene?)\b|海水|海洋",
    )
});
static FRESH: LazyLock<Regex> = LazyLock::new(|| {
    fixed(
        r"\b(?:freshwater|fresh water|susswasser|eau douce|agua dulce|acqua dolce|zoetwater|zoet water|river|fluss|lake|pond)\b|淡水|河川",
    )
});
static BODY: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r"\b(?:plasma|plasmatique|plasmatic[oa]|blood|blut|serum|sang|sangre|sangue|siero|suero|bloed|liver|leber|urine|urin|",
        r"fish|fische?n?|poissons?|pez|peces|pescados?|pesc[ei]|vis|vissen|depuration|biological half life)\b|",
        r"血中|血漿|血液|血浆|血清|魚|鱼|尿"
    ))
});
static STERILE: LazyLock<Regex> = LazyLock::new(|| {
    fixed(
        r"\b(?:steril\w*|abioti[csq]\w*|abiotisch\w*|autoclav\w*|autoklav\w*|gesteriliseerd\w*)\b|滅菌|無菌|非生物|灭菌|无菌",
    )
});
static ANAEROBIC: LazyLock<Regex> = LazyLock::new(|| {
    fixed(r"\b(?:anaerob\w*|anoxi\w*|anoxisch\w*|anaeroob|anaerobe)\b|嫌気|厌氧|厭氧|无氧|無氧")
});
static AEROBIC: LazyLock<Regex> = LazyLock::new(|| fixed(r"\b(?:aerob\w*|aeroob)\b|好気|好氧|有氧"));

/// Words that hold the name of a compartment and mean none, and denials of what is looked for.
static NO_COMPARTMENT: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r"\bwater (?:holding|content|capacity|saturat\w*)(?: capacity)?|\bmaximum water\b|\b(?:air|luft) ?(?:dried|dry|getrocknet\w*)|",
        r"\b(?:non|not|un|nicht|no|niet) ?steril\w*|\bunsteril\w*|\bwater sediment\b|\bsediment water\b|\bwasser sediment\b|",
        r"\beau sediment\b|\bagua sedimento\b|\bacqua sedimento\b|未滅菌|非滅菌|非灭菌|水 ?/? ?底質|水 ?/? ?沉积物"
    ))
});

/// Another compartment, a body, or a test in which nothing alive could degrade the substance.
fn in_another_medium(compartment: Compartment, plain: &str) -> Option<&'static str> {
    let plain = NO_COMPARTMENT.replace_all(plain, " ");
    let has = |pattern: &LazyLock<Regex>| pattern.is_match(&plain);
    let (soil, sediment, air) = (has(&SOIL), has(&SEDIMENT), has(&AIR));
    let water = has(&WATER) && !sediment;
    let (marine, fresh) = (has(&MARINE) && !has(&FRESH), has(&FRESH) && !has(&MARINE));
    let elsewhere = match compartment {
        Compartment::Soil => [(sediment, "sediment"), (water, "water"), (air, "air"), (marine, "the sea")],
        Compartment::FreshSediment => [(soil, "soil"), (water, "water"), (air, "air"), (marine, "the sea")],
        Compartment::MarineSediment => {
            [(soil, "soil"), (water && !marine, "water"), (air, "air"), (fresh, "fresh water")]
        }
        Compartment::Sediment => [(soil, "soil"), (water, "water"), (air, "air"), (false, "")],
        Compartment::FreshWater => {
            [(soil, "soil"), (sediment, "sediment"), (air, "air"), (marine, "the sea")]
        }
        Compartment::MarineWater => {
            [(soil, "soil"), (sediment, "sediment"), (air, "air"), (fresh, "fresh water")]
        }
        Compartment::Water => [(soil, "soil"), (sediment, "sediment"), (air, "air"), (false, "")],
        Compartment::Air => [(soil, "soil"), (sediment, "sediment"), (water, "water"), (false, "")],
    };
    let in_air = compartment == Compartment::Air;
    let in_sediment = matches!(
        compartment,
        Compartment::FreshSediment | Compartment::MarineSediment | Compartment::Sediment
    );
    let anaerobic = !in_air && !in_sediment && has(&ANAEROBIC) && !has(&AEROBIC);
    elsewhere
        .into_iter()
        .chain([
            (has(&BODY) || has(&TERRESTRIAL), "a body"),
            (!in_air && has(&STERILE), "a sterile test"),
            (anaerobic, "an anaerobic test"),
        ])
        .find_map(|(named, what)| named.then_some(what))
}
