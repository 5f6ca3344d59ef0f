//! Where the parts of a building stand in the job file. Calc carries the tokens and never looks into them.

use sagledger_calc::building::Origin;

use super::fault::Span;

#[derive(Clone, Debug, Default)]
pub(super) struct Origins {
    spans: Vec<Span>,
}

impl Origins {
    pub fn mark(&mut self, span: &Span) -> Origin {
        self.spans.push(span.clone());
        Origin(u32::try_from(self.spans.len() - 1).unwrap_or(u32::MAX))
    }

    pub fn span(&self, origin: Origin) -> Option<&Span> {
        self.spans.get(origin.0 as usize)
    }
}
