//! Every figure printed twice is the same figure, rounded to the fewer digits: wherever a quantity is printed, in
//! the data of the sheets or in the terminal's ledger, what stands there is the results file's full figure rounded to
//! the digits shown. Two roundings of one figure then agree by construction, and half-way cases need no allowance.

mod generate;

use sagledger::screen::{Screen, ledger};
use sagledger_sheets::{Overrides, source};
use serde_json::Value;

/// What a job prints, and the full figures behind it.
struct Job {
    name: String,
    parts: Vec<Value>,
    results: Value,
    terminal: String,
    /// How many figures were compared, and what did not agree.
    compared: usize,
    faults: Vec<String>,
}

impl Job {
    fn new(name: &str, text: &str) -> Option<Job> {
        let computed = sagledger::compute(sagledger::job::read(text.as_bytes(), "job.toml").job?).ok()?;
        let results = computed.results_text().unwrap();
        let files = source(&sagledger::package::draft(&computed, &results, Overrides::default())).unwrap();
        let data = files.bytes.iter().find(|(path, _)| path == "/package.json").unwrap();
        let data: Value = serde_json::from_slice(&data.1).unwrap();
        let heading = ledger::Heading { number: "1", title: "t", fingerprint: "0000 0000" };
        // Wide enough for all columns.
        let screen = Screen { width: Some(200), unicode: true, weights: false };
        Some(Job {
            name: name.into(),
            parts: data["parts"].as_array().unwrap().clone(),
            results: serde_json::from_str(&results).unwrap(),
            terminal: ledger::text(&screen, &heading, &computed.job.building, &computed.results, false),
            compared: 0,
            faults: vec![],
        })
    }

    /// A printed figure must be the full one, rounded to the digits that it shows.
    fn same(&mut self, what: &str, printed: &str, full: f64) {
        self.compared += 1;
        let Some((value, last)) = figure(printed) else {
            self.faults.push(format!("{}: {what}: \"{printed}\" is no figure; {full} in full", self.name));
            return;
        };
        // 1e-9: the results file keeps twelve digits, and a figure that lies half-way may round to either side.
        if (value - full).abs() > 0.5 * last * (1.0 + 1e-9) + 1e-9 * full.abs() {
            self.faults.push(format!("{}: {what}: {printed} is printed, {full} in full", self.name));
        }
    }

    /// Two printed texts of the same digits.
    fn equal(&mut self, what: &str, one: &str, other: &str) {
        self.compared += 1;
        if one != other {
            self.faults.push(format!("{}: {what}: \"{one}\" here, \"{other}\" there", self.name));
        }
    }

    fn part(&self, has: &str) -> Value {
        self.parts.iter().find(|p| p.get(has).is_some()).cloned().unwrap_or_default()
    }
}

/// A printed figure with the worth of its last place. Whole numbers of more than three figures may end in zeros that
/// only hold the place: `three` figures count then.
fn figure(printed: &str) -> Option<(f64, f64)> {
    let text = printed.trim().trim_start_matches('+').replace('\u{2212}', "-");
    let value: f64 = text.parse().ok()?;
    let digits = text.trim_start_matches('-');
    let last = match digits.split_once('.') {
        Some((_, decimals)) => 0.1_f64.powi(decimals.len() as i32),
        None if digits.len() > 3 => 10_f64.powi(digits.chars().rev().take_while(|c| *c == '0').count() as i32),
        None => 1.0,
    };
    Some((value, last))
}

fn list(value: &Value) -> Vec<Value> {
    value.as_array().cloned().unwrap_or_default()
}

fn text(value: &Value) -> &str {
    value.as_str().unwrap_or("")
}

/// Running text without its links.
fn said(value: &Value) -> String {
    match value {
        Value::String(text) => text.clone(),
        Value::Array(runs) => runs.iter().map(said).collect(),
        Value::Object(run) => ["text", "v"].iter().filter_map(|k| run.get(*k)).map(said).collect(),
        _ => String::new(),
    }
}

/// Actions by the names of columns, also the short ones.
fn action(column: &str) -> String {
    column.replace("imp. ", "imposed ").replace("imp.", "imposed").replace("perm.", "permanent")
}

/// A reaction that is nothing prints nothing.
fn reactions(job: &mut Job, what: &str, columns: &Value, figures: &Value, full: &Value, sign: f64) {
    for (column, printed) in list(columns).iter().zip(list(figures)) {
        let name = action(text(column).trim());
        let value = full[&name].as_f64().unwrap_or(0.0);
        match text(&printed) {
            "" => job.same(
                &format!("{what}, {name}, left empty"),
                "0.0",
                if value.abs() < 1e-6 { 0.0 } else { value },
            ),
            printed => job.same(&format!("{what}, {name}"), printed, sign * value),
        }
    }
}

fn results_of(job: &Job, mark: &str) -> Value {
    list(&job.results["beams"]).into_iter().find(|b| text(&b["mark"]) == mark).unwrap()
}

fn sheets_of_a_member(job: &mut Job, member: &Value) {
    let mark = text(&member["mark"]).to_string();
    let full = results_of(job, &mark);
    let (moment, move_, checks) = (&full["moment_kNm"], &full["deflection_mm"], list(&full["checks"]));
    let number = |value: &Value| value.as_f64().unwrap();
    let (most, least) = (number(&moment["max"]), number(&moment["min"]));
    let most = if least.abs() > most.abs() { least } else { most };

    // The strip of key figures.
    let figures = list(&member["figures"]);
    for (n, what, value) in [
        (0, "moment", most),
        (1, "shear", number(&full["shear_kN"]["max"]).abs()),
        (2, "own deflection", number(&move_["own_total"])),
    ] {
        assert!(text(&figures[n]["label"]).starts_with(what));
        job.same(&format!("{mark} key figures, {what}"), text(&figures[n]["value"]), value);
    }
    job.same(
        &format!("{mark} key figures, tilt"),
        one_in(text(&figures[4]["value"])).as_str(),
        inverse(&full["tilt"]),
    );

    // The checks, in the member's table and in that of the whole job.
    let rows = list(&member["checks"]);
    let groups = list(&job.part("groups")["groups"]);
    let governing = list(&groups.iter().find(|g| text(&g["mark"]) == mark).unwrap()["rows"]);
    assert_eq!((rows.len(), governing.len()), (checks.len(), checks.len()));
    for ((row, whole), check) in rows.iter().zip(&governing).zip(&checks) {
        let what = format!("{mark} {}, {}", text(&row["name"]), text(&row["place"]));
        for (printed, key) in [("demand", "demand"), ("limit", "capacity")] {
            let shown = text(&row[printed]);
            if let (Some(value), false) = (check[key].as_f64(), shown.is_empty()) {
                if text(&check["check"]) == "tilt" {
                    job.same(&format!("{what}, {printed}"), &one_in(shown), inverse(&check[key]));
                } else {
                    job.same(&format!("{what}, {printed}"), shown, value);
                }
            }
        }
        if let Some(share) = check["utilisation"].as_f64() {
            job.same(&format!("{what}, share"), text(&row["verdict"]["printed"]), share);
        }
        for key in ["name", "place"] {
            job.equal(&format!("{what}, governing checks"), text(&row[key]), text(&whole[key]));
        }
        job.equal(&what, text(&row["verdict"]["printed"]), text(&whole["verdict"]["printed"]));
    }

    workings(job, &mark, member, &rows, &checks, &full);

    // Reactions.
    for table in list(&member["reactions"]) {
        for (row, bearing) in list(&table["rows"]).iter().zip(list(&full["bearings"])) {
            let (what, reaction) = (format!("{mark} reactions, {}", said(&row["to"])), &bearing["reaction_kN"]);
            reactions(job, &what, &table["actions"], &row["figures"], reaction, 1.0);
            if table["with_greatest"] == true {
                job.same(&what, text(&row["characteristic"]), number(&reaction["characteristic_max"]));
                job.same(&what, text(&row["design"]), number(&reaction["design_max"]));
            }
        }
    }
    // What the site is told: "Seat of …; 8.63 kN down".
    for (item, bearing) in list(&member["site"]).iter().zip(list(&full["bearings"])) {
        let runs = list(&item["body"]);
        for (value, after) in runs.iter().zip(runs.iter().skip(1)) {
            if value["u"] == "kN" && text(after).starts_with(" down") {
                let design = number(&bearing["reaction_kN"]["design_max"]);
                job.same(&format!("{mark} to fix on site"), text(&value["v"]), design);
            }
        }
    }
    // Loads of beams that land here, under the names of their own sheets.
    for table in list(&member["loads"]) {
        let points = list(&table["points"]);
        for (point, landing) in
            points.iter().filter(|p| said(&p["what"]).ends_with(" lands")).zip(list(&full["landings"]))
        {
            let upper = results_of(job, text(&landing["mark"]));
            let place = number(&landing["at_m"]);
            let lands = list(&upper["bearings"]).into_iter().find(|b| {
                text(&b["on"]) == mark && b["lands_m"].as_f64().is_some_and(|at| (at - place).abs() < 1e-9)
            });
            let figures: Vec<Value> = list(&point["figures"]).iter().map(|f| f[0].clone()).collect();
            let what = format!("{mark} loads, {}", said(&point["what"]));
            if let Some(lands) = lands {
                reactions(job, &what, &table["actions"], &Value::Array(figures), &lands["reaction_kN"], 1.0);
            }
        }
    }
    // The second moment of area.
    let inertia = &full["second_moment_cm4"];
    for row in list(&member["properties"]["rows"]) {
        let what = said(&row["what"]);
        let symbols = list(&row["what"]).iter().any(|run| run["sym"] == "I_y");
        match (symbols, what.contains("required"), inertia["required"].as_f64()) {
            (true, true, Some(full)) => job.same(&format!("{mark} I_y required"), text(&row["value"]), full),
            (true, false, _) => job.same(&format!("{mark} I_y"), text(&row["value"]), number(&inertia["provided"])),
            _ => {}
        }
    }
    // The diagrams: the greatest moment carries its unit.
    let drawn = list(&member["diagrams"]["texts"]);
    let mut moments: Vec<String> = vec![];
    for label in &drawn {
        let runs = list(&label["runs"]);
        if runs.iter().any(|r| r["face"] == "unit" && text(&r["text"]).trim() == "kNm") {
            moments.extend(runs.iter().filter(|r| r["face"] == "semi-bold").map(|r| text(&r["text"]).to_string()));
        }
    }
    let size = |printed: &String| figure(printed).map_or(0.0, |(value, _)| value.abs());
    if let Some(greatest) = moments.iter().max_by(|a, b| size(a).total_cmp(&size(b))) {
        job.same(&format!("{mark} moment diagram"), greatest, most);
    }
}

/// "1/622" as "622"; a tilt that is nothing prints "0".
fn one_in(printed: &str) -> String {
    printed.trim_start_matches("1/").to_string()
}

fn inverse(tilt: &Value) -> f64 {
    match tilt.as_f64().unwrap().abs() {
        // Less than 1/100000 prints as nothing.
        tilt if tilt < 1e-5 => 0.0,
        tilt => 1.0 / tilt,
    }
}

/// The chapters of workings: each is of the worst check of its name.
fn workings(job: &mut Job, mark: &str, member: &Value, rows: &[Value], checks: &[Value], full: &Value) {
    let mut required: Option<(f64, String)> = None;
    let mut seen = std::collections::BTreeSet::new();
    for chapter in list(&member["workings"]) {
        let heading = text(&chapter["heading"]).to_string();
        let name = heading.split(", ").next().unwrap_or("").to_lowercase();
        let lines = list(&chapter["lines"]);
        let steps: Vec<Value> = lines.iter().flat_map(|l| list(&l["steps"])).collect();
        let results = |symbol: &str| -> Vec<(String, String)> {
            let named = steps
                .iter()
                .filter(|s| format!("{}_{}", text(&s["symbol"]["s"]), text(&s["symbol"]["sub"])) == symbol);
            named.map(|s| (text(&s["result"]).to_string(), text(&s["unit"]).to_string())).collect()
        };
        if heading.starts_with("Reactions") {
            for (n, bearing) in list(&full["bearings"]).iter().enumerate() {
                for (symbol, key) in [("R_Ed", "design_max"), ("R_k", "characteristic_max")] {
                    for (printed, _) in results(&format!("{symbol},{}", n + 1)) {
                        let what = format!("{mark} workings, {symbol},{}", n + 1);
                        job.same(&what, &printed, bearing["reaction_kN"][key].as_f64().unwrap());
                    }
                }
            }
            continue;
        }
        let of_name = rows.iter().zip(checks).filter(|(row, _)| {
            let row = text(&row["name"]).to_lowercase();
            name == row || (row == "web with bending" && name.starts_with("web with bending"))
        });
        let share = |check: &Value| check["utilisation"].as_f64().unwrap_or(0.0);
        // Of several places the worst is worked, the first of equals. A second chapter of the same name, and a web
        // that is worked for its force, say their place.
        let second = !seen.insert(name.clone()) || name.starts_with("web with bending");
        let here = |row: &Value| heading.contains(&format!("at {}", text(&row["place"])));
        let of_name: Vec<_> = of_name.filter(|(row, _)| !second || here(row)).collect();
        let worst = of_name.into_iter().reduce(|a, b| if share(b.1) > share(a.1) { b } else { a });
        let Some((row, check)) = worst else { continue };
        let what = format!("{mark} workings, {heading}");
        if let (Some(printed), Some(share)) =
            (steps.iter().rfind(|s| s["kind"] == "requirement"), check["utilisation"].as_f64())
        {
            job.same(&format!("{what}, share"), text(&printed["result"]), share);
            job.equal(&what, text(&printed["result"]), text(&row["verdict"]["printed"]));
        }
        let kind = text(&check["check"]);
        let symbols = match kind {
            "bending" => ("M_Ed", "M_c,Rd"),
            "shear" => ("V_Ed", "V_pl,Rd"),
            "web under concentrated force" => ("F_Ed", "F_Rd"),
            "total deflection" => ("w_tot", "w_lim"),
            "after deflection" => ("w_aft", "w_lim"),
            "variable deflection" => ("w_var", "w_lim"),
            "stacked deflection" => ("w_st", "w_lim"),
            _ => ("", ""),
        };
        for (symbol, key) in [(symbols.0, "demand"), (symbols.1, "capacity")] {
            // The figure that the check uses is the last of its name; earlier ones are steps on the way to it.
            if let (Some((printed, _)), Some(value)) = (results(symbol).last(), check[key].as_f64()) {
                let printed = printed.trim_start_matches('\u{2212}');
                job.same(&format!("{what}, {symbol}"), printed, value.abs());
            }
        }
        for (printed, _) in results("I_req") {
            let value = figure(&printed).map_or(0.0, |(value, _)| value);
            if required.as_ref().is_none_or(|(most, _)| value > *most) {
                required = Some((value, printed));
            }
        }
    }
    if let (Some((_, printed)), Some(value)) = (required, full["second_moment_cm4"]["required"].as_f64()) {
        job.same(&format!("{mark} workings, I_req"), &printed, value);
    }
}

fn take_down(job: &mut Job) {
    let part = job.part("tables");
    for table in list(&part["tables"]) {
        for group in list(&table["groups"]) {
            let mark = text(&group["mark"]).to_string();
            let full = results_of(job, &mark);
            let rows = list(&group["rows"]);
            let given: Vec<&Value> = rows.iter().filter(|row| said(&row["what"]).starts_with("to ")).collect();
            for (row, bearing) in given.iter().zip(list(&full["bearings"])) {
                let what = format!("{mark} take-down, {}", said(&row["what"]));
                reactions(job, &what, &table["actions"], &row["figures"], &bearing["reaction_kN"], -1.0);
            }
        }
        let totals = list(&table["totals"]);
        for (row, key) in totals.iter().zip(["applied_kN", "to_supports_kN"]) {
            let full = job.results["takedown"][key].clone();
            reactions(job, &said(&row["what"]), &table["actions"], &row["figures"], &full, 1.0);
        }
    }
    // Every characteristic reaction stands on the drawing of the load path.
    let mut drawn: Vec<String> = vec![];
    for drawing in list(&part["drawings"]) {
        for label in list(&drawing["texts"]) {
            drawn.extend(
                list(&label["runs"]).iter().map(|r| text(&r["text"]).trim_matches('\u{a0}').trim().to_string()),
            );
        }
    }
    if drawn.is_empty() {
        return;
    }
    for member in job.parts.clone().iter().filter(|p| p.get("figures").is_some()) {
        for table in list(&member["reactions"]).iter().filter(|t| t["with_greatest"] == true) {
            for row in list(&table["rows"]) {
                let printed = text(&row["characteristic"]).to_string();
                let found = drawn.iter().find(|text| **text == printed).cloned().unwrap_or("none such".into());
                job.equal(&format!("{} R_k on the load path", text(&member["mark"])), &found, &printed);
            }
        }
    }
}

fn stacked(job: &mut Job) {
    for row in list(&job.part("chains")["rows"]) {
        let mark = said(&row["mark"]);
        let full = results_of(job, &mark);
        let m = &full["deflection_mm"];
        let at = m["stacked_at_m"].as_f64().unwrap();
        // Where the greatest ratio stands elsewhere than the greatest movement, the file keeps the latter's parts.
        let here = figure(text(&row["at"])).is_some_and(|(place, last)| (place - at).abs() <= 0.5 * last);
        if here {
            for (key, value) in [
                ("own", "own_there"),
                ("inherited", "inherited_there"),
                ("settled", "settled_there"),
                ("stacked", "stacked_total"),
            ] {
                job.same(&format!("{mark} ledger, {key}"), text(&row[key]), m[value].as_f64().unwrap());
            }
        }
        let hand = text(&row["hand"]).to_string();
        let rule = hand.split(',').next().unwrap_or("").to_string();
        job.same(&format!("{mark} hand rule"), &rule, m["hand_rule"].as_f64().unwrap());
        let difference = m["hand_rule"].as_f64().unwrap() - m["stacked_total"].as_f64().unwrap().abs();
        if let Some(by) = hand.split(" by ").nth(1) {
            job.same(&format!("{mark} hand rule's difference"), by.trim_end_matches(" mm"), difference.abs());
        }

        // The same on the member's key figures, its row of checks where it has one, and in the terminal.
        let member = job.parts.iter().find(|p| p.get("figures").is_some() && text(&p["mark"]) == mark).unwrap();
        let key = text(&member["figures"][3]["value"]).to_string();
        job.equal(&format!("{mark} stacked, key figures"), &key, text(&row["stacked"]));
        let movements = job.terminal.split("\nmovement").nth(1).unwrap_or("").to_string();
        let line = movements.lines().find(|l| l.split_whitespace().next() == Some(&mark)).unwrap_or("").to_string();
        let cells: Vec<&str> = line.split_whitespace().collect();
        for (n, key) in ["at", "own", "settled", "inherited", "stacked", "limit", "left"].iter().enumerate() {
            if !text(&row[*key]).is_empty() {
                let cell = cells.get(n + 1).copied().unwrap_or("");
                job.equal(&format!("{mark} {key}, terminal"), cell, text(&row[*key]));
            }
        }
        let spoken = hand.replace(',', "").replace(" mm", "");
        let end = line.trim_end();
        let tail = end.get(end.len().saturating_sub(spoken.len())..).unwrap_or("").to_string();
        job.equal(&format!("{mark} hand rule, terminal"), &tail, &spoken);
    }
}

/// The terminal's line of each member has the figures of its closest check.
fn closest(job: &mut Job) {
    let members = job.terminal.split("\nmovement").next().unwrap_or("").to_string();
    for member in job.parts.clone().iter().filter(|p| p.get("figures").is_some()) {
        let mark = text(&member["mark"]);
        let Some(line) = members.lines().find(|l| l.split_whitespace().next() == Some(mark)) else { continue };
        let cells: Vec<&str> = line.split_whitespace().collect();
        let key = text(&member["figures"][5]["value"]).to_string();
        if key == "\u{2013}" || key.is_empty() {
            continue;
        }
        let found = cells.iter().find(|cell| **cell == key).copied().unwrap_or("none such");
        job.equal(&format!("{mark} closest check, terminal"), found, &key);
        let closest = text(&member["figures"][5]["below"]).replace('\u{200b}', "");
        let rows = list(&member["checks"]);
        let row = rows.iter().find(|row| {
            closest.starts_with(&format!("{},", text(&row["name"])))
                && text(&row["verdict"]["printed"]) == key
                && line.contains(text(&row["place"]))
        });
        let Some(row) = row else {
            job.faults.push(format!("{}: {mark}: no row of checks for \"{closest}\", {key}", job.name));
            continue;
        };
        for figure in ["demand", "limit"] {
            let printed = text(&row[figure]);
            let found = cells.iter().find(|cell| **cell == printed).copied().unwrap_or("none such");
            job.equal(&format!("{mark} {figure}, terminal"), found, printed);
        }
    }
}

fn compare(job: &mut Job) {
    for member in job.parts.clone().iter().filter(|p| p.get("figures").is_some()) {
        sheets_of_a_member(job, member);
    }
    take_down(job);
    stacked(job);
    closest(job);
}

#[test]
fn every_figure_printed_twice_is_the_same_figure() {
    let mut jobs = vec![];
    for name in ["garden-door", "weir-cottage", "packing-mezzanine"] {
        let path = format!("{}/sample-jobs/{name}/job.toml", env!("CARGO_MANIFEST_DIR"));
        jobs.push(Job::new(name, &std::fs::read_to_string(path).unwrap()).unwrap());
    }
    for seed in 0..30 {
        let generated = generate::building::building(7_000 + seed);
        jobs.push(Job::new(&format!("seed {seed}"), &generated.text).unwrap());
    }
    let (mut compared, mut faults) = (0, vec![]);
    for job in &mut jobs {
        compare(job);
        compared += job.compared;
        faults.append(&mut job.faults);
    }
    assert!(compared > 10_000, "only {compared} figures were compared");
    assert!(faults.is_empty(), "{} of {compared} differ:\n{}", faults.len(), faults.join("\n"));
}

#[test]
fn a_figure_that_differs_is_noticed() {
    let path = format!("{}/sample-jobs/weir-cottage/job.toml", env!("CARGO_MANIFEST_DIR"));
    let mut job = Job::new("weir-cottage", &std::fs::read_to_string(path).unwrap()).unwrap();
    job.same("rounded", "17.5", 17.52);
    job.same("rounded", "1290", 1287.0);
    assert!(job.faults.is_empty());
    job.same("one unit off", "17.6", 17.52);
    job.same("one unit off", "1290", 1284.0);
    job.same("no figure", "–", 1.0);
    assert_eq!(job.faults.len(), 3);
}
