use super::{Combined, Steel};
use crate::quantity::Length;

/// A force brought into the web through a flange.
#[derive(Clone, Debug, PartialEq)]
pub struct WebUnderForce {
    pub steel: Steel,
    pub force: Combined<1, 0>,
    pub way: Way,
    pub stiff: StiffLength,
    /// Distance between transverse stiffeners: the beam's length where it has none.
    pub a: Length,
}

/// How the force meets the web, EN 1993-1-5 Figure 6.1.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum Way {
    /// Type (a): through one flange, resisted by shear in the web on both sides.
    Within,
    /// Type (c): near the beam's end; `c` is the distance from the edge of the stiff length to the end, 0 or more.
    AtEnd { c: Length },
}

/// Over which length the force arrives stiffly, EN 1993-1-5 6.3.
#[derive(Clone, Debug, PartialEq)]
pub enum StiffLength {
    /// The seat on a wall.
    Seat(Length),
    /// A rolled beam that crosses: 2 t_f + t_w + 1.17 r of its section.
    Crossing { mark: String, t_f: Length, t_w: Length, r: Length },
    /// Not known (point loads): 0.
    Unknown,
}
