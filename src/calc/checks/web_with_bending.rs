use super::Combined;
use super::web_under_force::WebUnderForce;

/// The force on the web together with the moment of greatest size at the same place.
#[derive(Clone, Debug, PartialEq)]
pub struct WebWithBending {
    pub web: WebUnderForce,
    pub moment: Combined<1, 1>,
}
