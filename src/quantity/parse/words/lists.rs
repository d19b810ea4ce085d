//! The lists behind [`words`](super): each word folded by `plain_words`, in English, German, French, Spanish, Italian,
//! Dutch, Japanese and Chinese.

/// Words for a missing value in any cell, parted by `|`; spaces, case and accents make no difference.
pub(super) const MISSING: &[&str] = &[
    "nd|na|nb|nv|nr|ka|null|nil|none|tbd|tba|tbc|unknown|missing|blank|empty|pending|no data|no data available|data not available",
    "not available|not determined|not tested|not measured|not reported|not applicable|not known|not stated|not specified|not relevant",
    "no value",
    "unbekannt|fehlt|keine|leer|offen|entfällt|nicht bestimmt|nicht verfügbar|nicht anwendbar|nicht bekannt|nicht gemessen",
    "nicht geprüft|nicht ermittelt|nicht vorhanden|keine Angabe|keine Angaben|keine Daten|keine Daten verfügbar|keine Daten vorhanden",
    "nicht relevant|kein Wert",
    "inconnu|inconnue|non déterminé|non déterminée|non mesuré|non mesurée|non disponible|non communiqué|non renseigné|non renseignée",
    "sans objet|non applicable|non testé|non connu|aucune donnée|aucune donnée disponible|pas de données|pas de données disponibles",
    "donnée non disponible|données non disponibles|donnée manquante|manquant|vide|non spécifié|non indiqué|pas de valeur|sans données",
    "non concerné",
    "desconocido|desconocida|no disponible|no determinado|no determinada|no medido|no medida|no aplicable|no aplica|no procede",
    "sin datos|sin datos disponibles|no hay datos|no hay datos disponibles|dato no disponible|datos no disponibles|sin información",
    "no ensayado|no indicado|no especificado|no conocido|ninguno|ningún dato|faltante|vacío",
    "sconosciuto|sconosciuta|ignoto|non determinato|non determinata|non misurato|dato non disponibile|dati non disponibili",
    "non disponibile|non applicabile|nessun dato|nessun dato disponibile|non testato|non noto|non riportato|non indicato",
    "non specificato|mancante|vuoto",
    "onbekend|niet bepaald|niet beschikbaar|niet gemeten|niet van toepassing|nvt|geen gegevens|geen gegevens beschikbaar|geen data",
    "niet bekend|niet getest|niet gerapporteerd|niet opgegeven|niet vermeld|ontbreekt|leeg|geen waarde",
    "ー|なし|無し|データなし|データ無し|データがない|データはない|該当なし|該当データなし|該当せず|該当しない|不明|未測定|未試験|未実施|未定",
    "未記入|未調査|未入手|測定せず|適用外|対象外|入手不可|非該当|空欄|利用可能なデータなし|知見なし|記載なし",
    "无|無|无数据|無數據|无资料|無資料|暂无|暂无数据|暂无资料|未测定|未測試|未测试|未检测|不适用|不適用|未知|不详|不詳|没有数据|沒有數據",
    "无可用数据|无相关数据|未提供|未报告|缺失|待定|待测|空白|无值|未测",
];

/// Short forms that stand for a missing value where a number is asked for, and may be something else elsewhere (`NC` is a
/// structure, `SD` a name), and words that settle nothing in cells of words.
pub(super) const MISSING_NUMBER: &[&str] = &[
    "so|nc|ns|sd|si|sr|se|nm|ne|nt|nq|ni|nk|nds|npd|dnd|nvb|nbk|nbe|np|bd|x|xx|xxx|ナシ",
    "no information|no information available|data unavailable|unavailable|not found|data lacking|no data found|not analysed",
    "not analyzed|data gap|nicht zutreffend|nicht angegeben|nicht untersucht|keine Information|keine Informationen",
    "keine Daten bekannt|unzutreffend|aucune information|geen informatie|nessuna informazione|ningún resultado",
    "情報なし|情報無し|データ不足|无信息",
    "not measurable|not determinable|nicht messbar|nicht bestimmbar|non mesurable|non déterminable|no medible|non misurabile",
    "non determinabile|niet meetbaar|測定不能|測定不可|測定できず|測定不可能|测定不能|无法测定|無法測定|无法测量|不能测定",
];

/// Words that say something of a value but not how much; any of them may stand within a text.
pub(super) const VALUE_WORDS: &[&str] = &[
    "miscible immiscible insoluble soluble negligible decomposes decomposition sublimes stable persistent hydrolyses hydrolyzes low",
    "high reacts dispersible traces",
    "mischbar unloslich loslich schwerloslich leichtloslich vernachlassigbar zersetzt zersetzung sublimiert stabil hydrolysiert niedrig",
    "gering hoch wasserloslich wasserunloslich",
    "solubles insolubles misciable decompose decomposition negligeable faible eleve elevee stables reagit sublime peusoluble",
    "misible inmiscible inmisible descompone descomposicion despreciable bajo baja alto alta estable reacciona insolubles",
    "solubile insolubile miscibile immiscibile trascurabile decompone decomposizione basso bassa stabile reagisce",
    "oplosbaar onoplosbaar mengbaar verwaarloosbaar ontleedt ontleding laag hoog stabiel reageert persistente persistant 分解 溶解",
];

/// The same in scripts without spaces; any of them may stand anywhere.
pub(super) const VALUE_WORDS_WITHIN: &str = "不溶 可溶 易溶 難溶 难溶 微溶 混和 混溶 互溶 溶ける 溶けない 昇華 升华 安定 稳定 穩定 無視 可忽略 極めて低い 低い 高い";

/// Words after a bare number that are known to be remarks and no misspelt unit.
pub(super) const REMARK_STARTS: &[&str] = &[
    "at in for by from as under with oecd eu ec epa iso astm din glp ph ww dw wet dry measured meas exp expt experimental calc",
    "calculated computed est estimated predicted qsar fish lipid study primary ultimate method test ref reference read report",
    "klimisch reliability mean median average approx unpublished literature value value based using see guideline kow koc",
    "bei für fur laut nach mit aus gemessen experimentell berechnet geschatzt berechn fisch studie messwert literatur methode mittelwert",
    "a chez pour selon mesure mesuree experimental experimentale calcule calculee estime estimee poisson etude methode valeur moyenne",
    "en para segun medido medida calculado calculada estimado estimada pez pescado estudio metodo promedio media valor",
    "secondo con misurato misurata sperimentale calcolato calcolata stimato stimata pesce studio metodo valore",
    "not non no nicht niet pas ohne without sans sin senza zonder neutral wood buffer",
    "bij voor volgens met gemeten experimenteel berekend geschat vis studie methode waarde gemiddeld",
];

/// Words before a number, without `=` or `:`, that make the number theirs and no value.
pub(super) const NUMBERED: &str = concat!(
    "oecd eu ec eg epa oppts ocspp iso din astm tg method methode methodik metodo metodologia guideline richtlinie richtlijn ",
    "directrice linea ligne test essai ensayo prova ph year jahr annee ano anno jaar klimisch reliability zuverlassigkeit ",
    "ref no nr num page seite p n"
);

/// Words that lead a value and add nothing to it that could be missed; with others, only `=`, `:` or a unit shows that the
/// number is meant.
pub(super) const LABELS: &[&str] = &[
    "log lg log10 logkow logpow logp logd logkoa logkoc logbcf logbaf logbmf logtmf lgkow lgpow lgp kow pow koa koc oc ow k p d kd doc",
    "bcf bcfk bcfss baf bmf tmf dt dt50 degt50 dt50s t1 t 1 2 t50 half life halflife lc lc50 ec ec50 ec10 ic50 erc50 l e c50 c 50 10 noec",
    "noel pka pka1 pka2 pka3 pkb mw mm mp bp vp ws sw value values result mean average avg median ca the of at about measured exp experimental",
    "calc calculated estimated predicted est meas solubility water vapour vapor pressure melting point boiling molar mass henry constant",
    "halbwertszeit hwz wert ergebnis mittel mittelwert mittlere gemessen experimentell berechnet geschatzt loslichkeit dampfdruck",
    "schmelzpunkt siedepunkt molmasse sdp smp kp schmp temi demi vie temps valeur resultat moyenne mesure mesuree calcule calculee",
    "estime estimee experimentale solubilite pression vapeur fusion ebullition vida media valor resultado promedio medido medida calculado",
    "calculada estimado estimada solubilidad presion emivita tempo dimezzamento valore risultato misurato misurata calcolato calcolata",
    "stimato stimata sperimentale solubilita pressione halfwaardetijd halveringstijd waarde resultaat gemiddelde gemeten experimenteel",
    "berekend geschat oplosbaarheid dampdruk smeltpunt kookpunt",
    "値 測定値 実測値 実測 計算値 推定値 推算値 平均 平均値 結果 半減期 文献値 溶解度 蒸気圧 融点 沸点 实测 实测值 测定值 测量值 计算值 估算值 估计值 平均值 结果 值 实验值",
    "半衰期 熔点 沸点 蒸气压",
];

/// Words that turn a statement round, or a sign written as a word.
pub(super) const DENIALS: &[&str] = &[
    "not no non never neither nor without minus cannot nicht kein keine keinen nie ohne pas ne ni sans aucun aucune moins jamais",
    "sin ningun ninguna menos nunca senza nessun nessuna meno mai niet geen zonder nooit 不 未 非 無 无 没有 マイナス 负 負",
];

/// What a value of another kind is called; a number behind it is not the value of the column.
pub(super) const OTHER_KINDS: &[&str] = &[
    "dt90 degt90 dt10 t90 ec20 lc10 lc90 lc0 lc100 ec0 ec100 loec loel n sd rsd se cv r r2 ci temperature temperatur temp temperatura",
    "temperature 90 lipid fett lipide lipidos lipidi year jahr annee ano anno jaar ph klimisch reliability ref nr oecd range spanne",
    "duration dauer duree duracion durata duur exposure incubation testdauer versuchsdauer",
    "purity reinheit replicates ka",
];

/// Words before a time that make it the length of something.
pub(super) const SPANS: &str = concat!(
    "after in within for during throughout nach innerhalb wahrend binnen apres en dans pendant sous tras despues durante dopo entro ",
    "na gedurende"
);

/// Words between the parts of a ratio.
pub(super) const RATIO_WORDS: &str = "in of from auf von sur en de su di op van";

/// Words after a time that make it the length of a test.
pub(super) const TESTS: &str = concat!(
    "study studie test versuch exposure exposition incubation inkubation duration dauer essai etude ensayo estudio prova studio proef ",
    "試験 试验 培养"
);
