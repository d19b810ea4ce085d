//! The words that qualify a number, in English, German, French, Spanish, Italian, Dutch, Japanese and Chinese.
//!
//! Parted by `|`; case and accents make no difference. Of the phrases that fit, the longest counts.

use super::Qualifier;

/// Before a number.
pub(super) const BEFORE: &[(Qualifier, &[&str])] = &[
    (
        Qualifier::AtLeast,
        &[
            "greater than or equal to|more than or equal to|larger than or equal to|higher than or equal to|equal to or greater than",
            "not less than|no less than|not below|not lower than|no lower than|not under|at least|minimum|minimum of|min.|min",
            "größer oder gleich|groesser oder gleich|größer gleich|groesser gleich|mindestens|mind.|wenigstens|ab|nicht weniger als",
            "nicht unter|nicht kleiner als|nicht kleiner",
            "supérieur ou égal à|supérieure ou égale à|supérieur ou égal|plus grand ou égal à|au moins|au minimum|pas moins de|à partir de",
            "non inférieur à|pas inférieur à|minimum de",
            "mayor o igual que|mayor o igual a|mayor o igual|superior o igual a|igual o superior a|al menos|por lo menos|como mínimo",
            "no menos de|no inferior a|no menor de|no menor que|a partir de|mínimo|mín.",
            "maggiore o uguale a|maggiore o uguale|superiore o uguale a|uguale o superiore a|almeno|non meno di|come minimo|minimo",
            "non inferiore a|non minore di|a partire da",
            "groter dan of gelijk aan|gelijk aan of groter dan|hoger dan of gelijk aan|minstens|ten minste|tenminste|minimaal",
            "niet minder dan|niet lager dan|niet kleiner dan|vanaf",
            "少なくとも|最低でも|最低|最小",
            "大于等于|大于或等于|不小于|不低于|不少于|不短于|至少|最少|大於等於|大於或等於|不小於|不低於|不少於",
        ],
    ),
    (
        Qualifier::AtMost,
        &[
            "less than or equal to|lower than or equal to|smaller than or equal to|equal to or less than|not more than|no more than",
            "not greater than|no greater than|not larger than|not higher than|no higher than|not above|not over|not exceeding|does not exceed",
            "at most|up to|maximum|maximum of|max.|max",
            "kleiner oder gleich|kleiner gleich|höchstens|hoechstens|maximal|nicht mehr als|nicht größer als|nicht groesser als",
            "nicht größer|nicht über|nicht ueber|bis zu|bis",
            "inférieur ou égal à|inférieure ou égale à|inférieur ou égal|plus petit ou égal à|au plus|au maximum|pas plus de|jusqu'à",
            "non supérieur à|pas supérieur à|ne dépasse pas|ne dépassant pas|maximum de",
            "menor o igual que|menor o igual a|menor o igual|inferior o igual a|igual o inferior a|como máximo|como mucho|a lo sumo",
            "no más de|no superior a|no mayor de|no mayor que|hasta|máximo|máx.",
            "minore o uguale a|minore o uguale|inferiore o uguale a|uguale o inferiore a|al massimo|al più|non più di|non superiore a",
            "non maggiore di|fino a|massimo",
            "kleiner dan of gelijk aan|gelijk aan of kleiner dan|lager dan of gelijk aan|ten hoogste|hoogstens|hooguit|maximaal",
            "niet meer dan|niet hoger dan|niet groter dan|tot",
            "最大|最高|多くとも|高々|せいぜい",
            "小于等于|小于或等于|不大于|不超过|不高于|不多于|至多|最多|小於等於|小於或等於|不大於|不超過|不高於|不多於",
        ],
    ),
    (
        Qualifier::Above,
        &[
            "greater than|larger than|higher than|longer than|more than|above|over|exceeds|exceeding|in excess of",
            "größer als|grösser als|groesser als|größer|groesser|höher als|länger als|mehr als|oberhalb|oberhalb von|über|ueber",
            "supérieur à|supérieure à|supérieur|sup. à|plus grand que|plus grande que|plus élevé que|plus long que|plus de|au-dessus de",
            "au delà de|au-delà de|dépasse|excède",
            "mayor que|mayor de|mayor a|superior a|más de|más que|por encima de|excede de|excede|supera",
            "maggiore di|superiore a|più di|più lungo di|oltre|al di sopra di|sopra|supera|eccede",
            "groter dan|hoger dan|langer dan|meer dan|boven",
            "大于|高于|超过|多于|长于|大於|高於|超過|多於|長於",
        ],
    ),
    (
        Qualifier::Below,
        &[
            "less than|lower than|smaller than|shorter than|fewer than|below|under",
            "kleiner als|kleiner|weniger als|niedriger als|kürzer als|unterhalb|unterhalb von|unter",
            "inférieur à|inférieure à|inférieur|inf. à|plus petit que|plus petite que|moins de|en dessous de|au-dessous de|en-dessous de",
            "menor que|menor de|menor a|inferior a|menos de|menos que|por debajo de",
            "minore di|inferiore a|meno di|al di sotto di|sotto",
            "kleiner dan|lager dan|korter dan|minder dan|onder|beneden",
            "小于|低于|少于|短于|不到|不足|未满|小於|低於|少於|短於|未滿",
        ],
    ),
    (
        Qualifier::About,
        &[
            "approximately|approx.|approx|about|around|roughly|circa|ca.|ca|c.|cca",
            "etwa|ungefähr|ungefaehr|rund|zirka|näherungsweise|ungef.",
            "environ|env.|env|approximativement|à peu près|autour de|près de|de l'ordre de",
            "aproximadamente|aprox.|aprox|alrededor de|cerca de|en torno a|unos|unas",
            "approssimativamente|intorno a|attorno a|all'incirca|pressappoco",
            "ongeveer|ongev.|rond|bij benadering|plm.|plm",
            "約|およそ|おおよそ|ほぼ|概ね|大体",
            "约|约为|大约|大概|約為|大約",
        ],
    ),
    (
        Qualifier::Between,
        &[
            "between|zwischen|entre|compris entre|comprise entre|comprendido entre|tra|fra|compreso tra|compreso fra|tussen|介于|介於",
        ],
    ),
    (Qualifier::From, &["from|von|de|du|desde|da|dal|van|从|從|自|由"]),
    (
        Qualifier::Exactly,
        &["equal to|equals|is|gleich|ist|égal à|igual a|es|uguale a|è|gelijk aan|は|为|為|是|等于|等於"],
    ),
];

/// After a number and its unit.
pub(super) const AFTER: &[(Qualifier, &[&str])] = &[
    (
        Qualifier::AtLeast,
        &[
            "or more|or higher|or above|or greater|or longer|or over|and above|and more|and over|and higher|upwards|minimum",
            "oder mehr|oder höher|oder größer|oder länger|und mehr|und höher|und darüber|mindestens",
            "ou plus|ou supérieur|ou davantage|et plus|et au-delà|au minimum|o más|o superior|o mayor|y más|como mínimo|mínimo",
            "o più|o superiore|o maggiore|e oltre|minimo|of meer|of hoger|of langer|en hoger|en meer|minimaal",
            "以上|及以上|或以上|或更高|或更多|或更长|または以上",
        ],
    ),
    (
        Qualifier::AtMost,
        &[
            "or less|or lower|or below|or shorter|or under|and below|and less|maximum|max.|max",
            "oder weniger|oder kürzer|oder niedriger|oder kleiner|und weniger|und darunter|maximal|höchstens",
            "ou moins|ou inférieur|et moins|au maximum|o menos|o inferior|o menor|y menos|como máximo|máximo",
            "o meno|o inferiore|o minore|massimo|of minder|of lager|of korter|en lager|maximaal",
            "以下|以内|以內|及以下|或以下|或更低|或更少|或更短",
        ],
    ),
    (
        Qualifier::Above,
        &["超|を超える|を超え|超え|より大きい|よりも大きい|より大|より高い|より長い|より多い|超过"],
    ),
    (Qualifier::Below, &["未満|より小さい|よりも小さい|より小|より低い|より短い|より少ない|未满|を下回る"]),
    (
        Qualifier::About,
        &[
            "approximately|approx.|approx|ca.|circa|environ|env.|aproximadamente|aprox.|ongeveer|or so",
            "程度|前後|前后|左右|上下|ぐらい|くらい|ほど",
        ],
    ),
];
