//! `[basis]`.

use sagledger_calc::actions::{Choices, StrengthRule};
use sagledger_calc::materials::Grade;

use crate::job::findings::Findings;
use crate::job::keys;
use crate::job::view::{Item, Table};

/// What was typed; defaults are taken where the building is made, so that they can be said.
#[derive(Default)]
pub(crate) struct TypedBasis {
    pub choices: Option<Choices>,
    pub rule: Option<StrengthRule>,
    pub grade: Option<Grade>,
    pub shear_flexibility: Option<bool>,
}

pub(super) fn read(root: &Table, found: &mut Findings) -> TypedBasis {
    let Some(table) = root.get("basis").and_then(|item| item.table(&keys::BASIS, found)) else {
        return TypedBasis::default();
    };
    let choices: Vec<(&'static str, Choices)> = Choices::ALL.iter().map(|c| (c.name(), *c)).collect();
    let rules = [("6.10", StrengthRule::Single), ("6.10a/b", StrengthRule::Pair)];
    TypedBasis {
        choices: table.field("national-choices", found, |item, f| item.choice(&choices, f)).value().copied(),
        rule: table.field("combination", found, |item, f| item.choice(&rules, f)).value().copied(),
        grade: table.field("grade", found, grade).value().copied(),
        shear_flexibility: table.field("shear-flexibility", found, Item::flag).value().copied(),
    }
}

pub(super) fn grade(item: &Item, found: &mut Findings) -> Option<Grade> {
    let grades: Vec<(&'static str, Grade)> = Grade::ALL.iter().map(|g| (g.name(), *g)).collect();
    item.choice(&grades, found)
}
