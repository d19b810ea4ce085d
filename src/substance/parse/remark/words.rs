//! The words of remarks, in English, German, French, Spanish, Italian, Dutch, Japanese and Chinese.
//!
//! The patterns look at words folded by `plain_words`, with spaces where scripts meet. Japanese and Chinese words may stand
//! within longer ones.

use std::sync::LazyLock;

use regex::Regex;

use crate::substance::parse::pattern::{fixed, fixed_by_parts};

/// Whole words of languages that part them, and parts of words of those that do not.
fn words(whole: &[&str], within: &[&str]) -> Regex {
    fixed_by_parts(&format!(r"\b(?:{})\b|{}", whole.join("|"), within.join("|")))
}

const CALCULATED_WORDS: &[&str] = &[
    r"calc|calcd|calculat\w+|comput\w+|predict\w*|estimat\w*|est|qsars?|qspr|model|models|modell\w*|modeling|in silico",
    r"read across|simul\w*|regression\w*|group contribution\w*|theor\w*|expected|presum\w*|probabl\w*|likely",
    r"analogon|analoga|analog|analogs|analog(?:stoff|substanz|verbindung)\w*|strukturanalog\w*|analog[oa]s?|analogh[ie]|analoog|analoge|surrogat\w*",
    r"(?:similar|related|source) (?:substances?|compounds?|chemicals?)|ahnliche\w* (?:stoff|substanz|verbindung)\w*|substances? similaires?",
    r"expert (?:judge?ment|opinion|estimate)|extrapol\w*|interpol\w*|assum\w+|default|worst case|analogues?",
    r"berechn\w*|rechnerisch\w*|kalkul\w*|(?:ab)?geschatzt\w*|(?:ab)?geschaetzt\w*|(?:ab)?schatz\w*|vorhergesagt\w*",
    r"vorhersag\w*|angenommen\w*|vermut\w*|voraussichtlich\w*|analogie\w*|expertenurteil",
    r"calcul\w*|estim\w*|predit\w*|prediction\w*|modelis\w*|modeles?|suppose\w*|presume\w*|lecture croisee|par defaut",
    r"predich\w*|previst\w*|modelad\w*|modelos?|teoric\w*|supuest\w*|presunt\w*|lectura cruzada|por defecto",
    r"calcol\w*|stim\w*|predett\w*|modellat\w*|modell[oi]|presunt\w*|predefinit\w*",
    r"berekend\w*|berekening\w*|geschat\w*|schatting\w*|voorspel\w*|gemodelleerd\w*|aangenomen|verondersteld\w*",
];
const CALCULATED_PARTS: &[&str] = &[
    "計算",
    "推定",
    "推算",
    "予測",
    "概算",
    "類推",
    "外挿",
    "モデル",
    "计算",
    "估算",
    "估计",
    "估計",
    "预测",
    "預測",
    "推测",
    "模型",
    "类推",
    "類似物質",
    "类似物",
    "外推",
    "理论",
    "默认",
];

/// Said to be calculated, predicted, or taken from something else.
pub(super) static CALCULATED: LazyLock<Regex> = LazyLock::new(|| words(CALCULATED_WORDS, CALCULATED_PARTS));

const MEASURED_WORDS: &[&str] = &[
    r"measured|measurement|meas|experiment\w*|exp|expt|exptl|glp|study|studie|versuch|gemessen\w*|messwert\w*|messung\w*",
    r"shake flask|slow stir\w*|generator column|hplc|schuttel\w*",
    r"mesure\w*|essais?|etudes?|flacon agite|medid[oa]s?|medicion\w*|ensayos?|ensayad\w*|estudios?",
    r"misurat\w*|misur[ae]|misurazion\w*|sperimental\w*|prov[ae]|saggi[o]?|studio|gemeten|meting\w*|meetwaarde\w*|proef|onderzoek",
];
const MEASURED_PARTS: &[&str] =
    &["実測", "測定", "実験", "試験", "实测", "实验", "试验", "测定", "测量", "測量", "實測", "實驗"];

/// Said to be measured, by a word that may be denied.
pub(super) static MEASURED: LazyLock<Regex> = LazyLock::new(|| words(MEASURED_WORDS, MEASURED_PARTS));

/// Doubt whether a value was measured, besides a question mark.
pub(super) static DOUBT: LazyLock<Regex> = LazyLock::new(|| {
    words(
        &[
            r"maybe|perhaps|possibl[ey]|unsure|uncertain|unclear|doubtful|questionable|unconfirmed|unverified|tbc|tbd|to be (?:confirmed|checked|verified)",
            r"vielleicht|evtl|eventuell|moglicherweise|wahrscheinlich|unsicher|unklar|fraglich|unbestatigt|ungepruft|zu (?:prufen|klaren|bestatigen)",
            r"peut etre|possiblement|probablement|incertain\w*|douteu\w*|a (?:verifier|confirmer)|quizas?|tal vez|acaso|dudos\w*|incierto|por (?:confirmar|verificar)",
            r"forse|dubbi\w*|incert\w*|da (?:verificare|confermare)|misschien|mogelijk\w*|waarschijnlijk|onzeker|onduidelijk|twijfelachtig|te (?:bevestigen|controleren)",
        ],
        &[
            "不明",
            "不確か",
            "要確認",
            "未確認",
            "おそらく",
            "恐らく",
            "たぶん",
            "多分",
            "かも",
            "可能",
            "也许",
            "也許",
            "大概",
            "待确认",
            "待確認",
            "待核实",
            "存疑",
            "不确定",
            "不確定",
        ],
    )
});

/// A measurement or test that is still to come, is wanted, or was left out, and one that is only like another.
pub(super) static PLANNED: LazyLock<Regex> = LazyLock::new(|| {
    words(
        &[
            r"to be|will be|should be|shall be|must be|yet to|planned|planning|pending|missing|lacking|requested|required|needed|ongoing|on going",
            r"waived|waiver|waiving|in progress|under ?way|outstanding|ordered|commissioned|scheduled|proposed|proposal|intended|awaited|awaiting",
            r"(?:not|never) (?:yet )?(?:performed|conducted|done|carried out|started|completed|available)|postponed|cancelled|similar to|in preparation",
            r"geplant\w*|ausstehend\w*|steht (?:noch )?aus|beauftragt\w*|angefordert\w*|erforderlich\w*|fehlt|fehlend\w*|lauft|laufend\w*",
            r"vorgesehen\w*|soll|muss|zu messen|messen|in arbeit|in auftrag|noch offen|nicht durchgefuhrt\w*|verzicht\w*|beantragt\w*",
            r"prevue?s?|a mesurer|a faire|a realiser|a effectuer|a determiner|en attente|en cours|manquante?s?|demandee?s?|planifiee?s?|requise?s?",
            r"non (?:realise|effectue|mene)\w*|sera|dispense|planificad[oa]s?|previst[oaie]s?|pendientes?|por medir|a medir|en curso|falta\w*",
            r"solicitad[oa]s?|requerid[oa]s?|sera medid[oa]|no realizad[oa]s?|pianificat[oaie]|programmat[oaie]|da misurare|da eseguire|in corso",
            r"mancant[ei]|richiest[oaie]|in attesa|non eseguit[oaie]|sara|gepland\w*|te meten|lopende?|loopt|ontbreekt|ontbrekend\w*|aangevraagd\w*",
            r"in behandeling|in uitvoering|niet uitgevoerd\w*|vereist\w*|wordt|moet",
        ],
        &[
            "予定",
            "計画",
            "待ち",
            "実施中",
            "試験中",
            "測定中",
            "申請中",
            "免除",
            "未実施",
            "必要",
            "计划",
            "計劃",
            "待测",
            "待測",
            "待定",
            "进行中",
            "進行中",
            "拟",
            "预定",
            "豁免",
            "需要",
            "未进行",
            "将",
        ],
    )
});

/// Words for measuring and for calculating side by side, joined by a word for `or` or `and`.
pub(super) static MEASURED_OR_CALCULATED: LazyLock<Regex> = LazyLock::new(|| {
    const JOINED: &str =
        "(?: (?:values? |werte? )?(?:or|and|oder|und|ou|et|o|u|y|e|of|en|bzw|resp|vs)){1,2} ";
    const JOINED_SIGNS: &str =
        "値?(?:值)? ?(?:or ?|及び|および|または|又は|もしくは|と|か|或者?|和|及|与|與)+ ?";
    let (measured, calculated) = (MEASURED_WORDS.join("|"), CALCULATED_WORDS.join("|"));
    let (measured_parts, calculated_parts) = (MEASURED_PARTS.join("|"), CALCULATED_PARTS.join("|"));
    fixed_by_parts(&format!(
        concat!(
            r"\b(?:{m}){j}(?:{c})\b|\b(?:{c}){j}(?:{m})\b|",
            r"(?:{mp}){js}(?:{cp})|(?:{cp}){js}(?:{mp})"
        ),
        m = measured,
        c = calculated,
        j = JOINED,
        mp = measured_parts,
        cp = calculated_parts,
        js = JOINED_SIGNS
    ))
});

/// A denial before a word for measuring, or after it.
pub(super) static NOT_MEASURED: LazyLock<Regex> = LazyLock::new(|| {
    let measured = MEASURED_WORDS.join("|");
    let denial = concat!(
        "not|non|nicht|no|keine?|kein|ohne|without|instead of|statt|anstatt|pas|sans|aucune?|jamais|sin|ningun\\w*|nunca|en vez de|",
        "senza|nessun\\w*|mai|invece di|niet|geen|zonder|nooit|never"
    );
    fixed_by_parts(&format!(
        concat!(
            r"\b(?:{denial}) (?:\w+ ){{0,2}}(?:{measured}|test|oecd|oecd \d+)\b|",
            r"\b(?:{measured}) (?:no|non|nein|nee|not|nicht|niet|false|falsch|faux)\b|\bunmeasured\b|\bungemessen\w*|",
            r"(?:未|非|無|无|没有|沒有|没|不|尚未)\S{{0,3}}(?:測|测|実測|实测|實測|実験|实验|試験|试验)|",
            r"(?:測定|実測|実験|試験|测定|实测|实验|试验)値?\S{{0,5}}(?:なし|無し|ない|せず|未|ではな|不能|不可)"
        ),
        denial = denial,
        measured = measured
    ))
});

/// A test guideline by its number.
pub(super) static GUIDELINE: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r"\boecd (tg |no |nr |guideline |test |test guideline |method |ligne directrice |richtlinie |richtlijn )?\d{3}[a-z]?\b|\boecd\d{3}[a-z]?\b|",
        r"\b(eu|ec|eg|ue|ce) (test )?(method |methode |metodo )?[abc] \d{1,2}\b|\b(oppts|ocspp) \d{3}\b|\biso \d{4,5}\b|",
        r"\bastm e ?\d{3,4}\b|\bdin (en )?(iso )?\d{4,5}\b|\bjis [a-z] ?\d{4}\b|\bgb t ?\d{4,5}\b|^[abc] \d{1,2}$|^c 4 [a-f]$"
    ))
});

const ULTIMATE_WORDS: &str = concat!(
    r"ultimate|ultimativ\w*|mineralis\w*|mineraliz\w*|endabbau|(?:bio)?degrad\w* (?:ultime|ultima|finale?)|ultiem\w*|",
    r"volledige afbraak"
);

pub(super) static ULTIMATE: LazyLock<Regex> = LazyLock::new(|| {
    words(
        &[ULTIMATE_WORDS],
        &["究極", "完全分解", "完全生分解", "無機化", "最终降解", "最终生物降解", "完全降解", "矿化", "礦化"],
    )
});

/// A denial makes no degradation ultimate.
pub(super) static NOT_ULTIMATE: LazyLock<Regex> = LazyLock::new(|| {
    fixed_by_parts(&format!(
        concat!(
            r"\b(?:no|not|non|without|incomplete|partial|little|low|nicht|keine?|ohne|geringe?|unvollstandige?|teilweise|pas|sans|",
            r"aucune|partielle|incomplete|faible|sin|parcial|incompleta|baja|poca|senza|parziale|incompleta|scarsa|niet|geen|zonder|",
            r"gedeeltelijke|onvolledige|geringe) (?:\w+ )?(?:{words})\b|",
            r"(?:未|不|非|部分|無|无|没有)\S{{0,2}}(?:究極|完全|無機化|最终|矿化)"
        ),
        words = ULTIMATE_WORDS
    ))
});

pub(super) static PRIMARY: LazyLock<Regex> = LazyLock::new(|| {
    words(&[r"primary|primar\w*|primaer\w*|primaire\w*|primair\w*"], &["一次分解", "初级", "初級"])
});

/// Ways in which a substance goes that are not its degradation by organisms; the test guidelines by their titles.
pub(super) static DISSIPATION: LazyLock<Regex> = LazyLock::new(|| {
    words(
        &[
            r"dissipat\w*|disappear\w*|verschwind\w*|volatili[szt]\w*|fluchtig\w*|disparition|disip\w*|desaparic\w*|dissipaz\w*",
            r"scomparsa|vervluchtig\w*|verdwijn\w*|evapora\w*|verdampf\w*",
        ],
        &["消失", "揮発", "散逸", "消散", "挥发", "消解"],
    )
});
pub(super) static HYDROLYSIS: LazyLock<Regex> = LazyLock::new(|| {
    words(
        &[
            r"hydrolys\w*|hydrolyt\w*|hidrolis\w*|hidrolit\w*|idrolis\w*|idrolit\w*|oecd (?:tg |no |test |guideline )?111",
        ],
        &["加水分解", "水解"],
    )
});
pub(super) static PHOTOLYSIS: LazyLock<Regex> = LazyLock::new(|| {
    words(
        &[
            r"photolys\w*|photolyt\w*|photodegrad\w*|photooxid\w*|photo ?abbau|fotolis\w*|fotolys\w*|fotolit\w*|fotodegrad\w*",
            r"oecd (?:tg |no |test |guideline )?316",
        ],
        &["光分解", "光解", "光降解"],
    )
});

pub(super) static ORGANISM: LazyLock<Regex> = LazyLock::new(|| {
    words(
        &[
            r"fish|fische?n?|daphni\w*|algae?|algal|algen?|grunalgen?|carp|karpfen|\w*trout|\w*forellen?|zebrafish",
            r"zebrabarbling|\w*minnow|medaka|bluegill|invertebrates?|wirbellosen?|mysids?|crustacea\w*|krebstiere?|mussels?",
            r"oncorhynchus|danio|cyprinus|pimephales|lemna|chironom\w*|pseudokirchneriella|raphidocelis|desmodesmus",
            r"poissons?|truites?|carpes?|algues?|daphnies?|crustaces?|moules?|invertebres?|lentilles? d eau",
            r"pez|peces|pescados?|truchas?|carpas?|algas?|dafnias?|crustaceos?|mejillon\w*|invertebrados?",
            r"pesc[ei]|trot[ae]|carp[ae]|alg[ae]|alghe|dafni\w*|crostace\w*|mitili|invertebrat\w*",
            r"vis|vissen|forel|karper|algen|watervlo\w*|kreeftachtig\w*|mossel\w*|ongewervelden|コイ",
        ],
        &[
            "魚",
            "メダカ",
            "ニジマス",
            "ミジンコ",
            "藻",
            "甲殻",
            "ゼブラフィッシュ",
            "鱼",
            "溞",
            "水蚤",
            "甲壳",
            "无脊椎",
        ],
    )
});

/// The names of the values themselves say nothing on how they were obtained.
pub(super) static VALUE_NAME: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r"^((log|lg|log10) ?(k ?ow|p ?ow|k?ow|pow|p|d|koa|koc|bcf|baf|kow|bmf|tmf)|log|lg|log10|logarithm|k ?ow|p ?ow|koa|d|p|pka ?\d?|mean|mittelwert|dt ?50|degt ?50|t ?1 2|t half|bcf|baf|bmf|tmf|k?oc|",
        r"lc ?50|ec ?50|noec|ec ?10|half life|halbwertszeit|hwz|pka|mw|mp|bp|vp|ww|wwt|wet weight|log k ?ow|log p ?ow|value|wert|",
        r"temps de demi vie|demi vie|valeur|vida media|valor|emivita|tempo di dimezzamento|valore|halfwaardetijd|halveringstijd|waarde|",
        r"solubility|loslichkeit|solubilite|solubilidad|solubilita|oplosbaarheid|半減期|半衰期|値|值|溶解度)( value| wert| 値| 值)?$"
    ))
});

/// That nothing, or how little, was degraded: then the number beside it is the length of the test.
pub(super) static NO_DEGRADATION: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r"\b(?:no|not|non|without|little|nicht|keine?|ohne|pas|sans|aucune|sin|senza|nessuna|niet|geen|zonder|never) (?:\w+ ){0,2}",
        r"(?:bio)?(?:degrad\w*|abbau\w*|abgebaut\w*|afbraak|afgebroken|afbreekbaar|decompos\w*|descompo\w*|elimin\w*|hydrolys\w*|",
        r"hidrolis\w*|idrolis\w*|disappear\w*|dissipat\w*|change|anderung|loss)\b|",
        r"\b(?:stable|stabil|stables|estable|stabile|stabiel|persistent\w*|persistant\w*|undegraded|unabgebaut)\b|",
        r"(?:未|不|無|无|没有|难|難)\S{0,2}(?:分解|降解)|(?:分解|降解)\S{0,3}(?:なし|無し|ない|せず|されず|されない)|安定|稳定|穩定"
    ))
});

/// Stability that is denied, or of another kind: it does not speak against a half-life.
pub(super) static NOT_OF_DEGRADATION: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r"\b(?:not|non|no|nicht|pas|niet) (?:\w+ )?(?:stab\w*|estable|persist\w*)\b|",
        r"\b(?:hydrolytically|photolytically|thermally|chemically|hydrolytisch|thermisch|chemisch|to hydrolysis|to light) stab\w*|",
        r"\bstab\w* (?:to|against|towards|gegen) (?:hydrolysis|hydrolyse|light|licht|heat)\b"
    ))
});
