//! Pieces that several entries of the results file share.

use sagledger_calc::actions::{Action, Actions};
use sagledger_calc::quantity::Force;
use serde::{Serialize, Serializer};

use super::Figure;

/// Figures by the name of their action, in the order of the actions.
pub struct PerAction(Vec<(String, Figure)>);

impl Serialize for PerAction {
    fn serialize<S: Serializer>(&self, serializer: S) -> Result<S::Ok, S::Error> {
        serializer.collect_map(self.0.iter().map(|(name, figure)| (name, figure)))
    }
}

/// Forces in kN by action.
pub fn per_action(actions: &Actions, forces: &[(Action, Force)]) -> PerAction {
    PerAction(forces.iter().map(|(action, f)| (actions.name(*action), Figure(f.to_kn()))).collect())
}

/// Any figures by action.
pub fn figures(actions: &Actions, list: impl IntoIterator<Item = (Action, f64)>) -> PerAction {
    PerAction(list.into_iter().map(|(action, value)| (actions.name(action), Figure(value))).collect())
}
