#![allow(clippy::print_stdout, reason = "probe")]
use crate::cells::describe;
#[test]
fn probe() {
    for line in std::fs::read_to_string("/tmp/probe/cells.txt").unwrap().lines() {
        let (h, c) = line.split_once('\t').unwrap();
        println!("{h} | {c}\n      => {}", describe(h, &c.replace("\\n", "\n")));
    }
}
#[test]
fn timing() {
    use kowledger::quantity::*;
    for unit in [
        "4;", ":", "= ", "4:", "(", "a 4 ", "4 and ", "4/", "<", "log ", "a:4=", "4.5 a ", "1,", "、",
        "以上", "4~", "\n", "not ", "4.2 (5) ", "x/", "E-", "4 to ", "- ", "'", "4²", "&lt;", "ー4", "d/",
        "mg/L ",
    ] {
        let time = |n: usize| {
            let text: String = unit.repeat(n / unit.len());
            let t = std::time::Instant::now();
            for _ in 0..5 {
                let _ = parse_quantities(
                    &text,
                    ReadAs {
                        dimension: Dimension::Time,
                        default_unit: Unit::Day,
                        decimal: DecimalStyle::Point,
                        scale: Scale::Linear,
                        molar_mass: None,
                    },
                );
            }
            t.elapsed().as_micros() / 5
        };
        let (a, b) = (time(950), time(1900));
        println!("{unit:?} {a} {b}");
    }
}
