//! A symmetric matrix kept from each row's first entry to its diagonal, factored into L D L'.

#[derive(Clone, Debug)]
pub struct ProfileMatrix {
    first: Vec<usize>,
    rows: Vec<Vec<f64>>,
}

impl ProfileMatrix {
    /// A zero matrix that will hold the pairs of freedoms that each group couples.
    pub fn coupling(size: usize, groups: &[Vec<usize>]) -> ProfileMatrix {
        let mut first: Vec<usize> = (0..size).collect();
        for group in groups {
            if let Some(least) = group.iter().copied().min() {
                for &member in group {
                    first[member] = first[member].min(least);
                }
            }
        }
        let rows = first.iter().enumerate().map(|(row, first)| vec![0.0; row - first + 1]).collect();
        ProfileMatrix { first, rows }
    }

    pub fn add(&mut self, row: usize, column: usize, value: f64) {
        if column <= row {
            self.rows[row][column - self.first[row]] += value;
        }
    }

    pub fn times(&self, vector: &[f64]) -> Vec<f64> {
        let mut product = vec![0.0; vector.len()];
        for (row, entries) in self.rows.iter().enumerate() {
            for (offset, entry) in entries.iter().enumerate() {
                let column = self.first[row] + offset;
                product[row] += entry * vector[column];
                if column != row {
                    product[column] += entry * vector[row];
                }
            }
        }
        product
    }

    pub fn factored(&self) -> Factor {
        let mut lower = self.rows.clone();
        let mut diagonal: Vec<f64> = Vec::with_capacity(lower.len());
        for row in 0..lower.len() {
            let (done, rest) = lower.split_at_mut(row);
            let entries = &mut rest[0];
            let first = self.first[row];
            // Entries hold l times d until the row is divided below.
            for column in first..row {
                let other = &done[column];
                let from = first.max(self.first[column]);
                let mut sum = 0.0;
                for k in from..column {
                    sum += entries[k - first] * other[k - self.first[column]];
                }
                entries[column - first] -= sum;
            }
            let mut pivot = entries[row - first];
            for column in first..row {
                let value = entries[column - first];
                entries[column - first] = value / diagonal[column];
                pivot -= value * value / diagonal[column];
            }
            assert!(pivot > 0.0, "the building is a mechanism at freedom {row}");
            entries[row - first] = 1.0;
            diagonal.push(pivot);
        }
        Factor { first: self.first.clone(), lower, diagonal }
    }
}

pub struct Factor {
    first: Vec<usize>,
    lower: Vec<Vec<f64>>,
    diagonal: Vec<f64>,
}

impl Factor {
    pub fn solve(&self, right: &[f64]) -> Vec<f64> {
        let mut x = right.to_vec();
        for row in 0..x.len() {
            let first = self.first[row];
            let sum: f64 = (first..row).map(|column| self.lower[row][column - first] * x[column]).sum();
            x[row] -= sum;
        }
        for (value, pivot) in x.iter_mut().zip(&self.diagonal) {
            *value /= pivot;
        }
        for row in (0..x.len()).rev() {
            let first = self.first[row];
            for column in first..row {
                x[column] -= self.lower[row][column - first] * x[row];
            }
        }
        x
    }
}

#[test]
fn a_small_system_is_solved() {
    let mut matrix = ProfileMatrix::coupling(3, &[vec![0, 1], vec![1, 2]]);
    for (row, column, value) in [(0, 0, 4.0), (1, 0, 2.0), (1, 1, 5.0), (2, 1, -1.0), (2, 2, 3.0)] {
        matrix.add(row, column, value);
    }
    let right = matrix.times(&[1.0, -2.0, 3.0]);
    assert_eq!(right, [0.0, -11.0, 11.0]);
    for (found, expected) in matrix.factored().solve(&right).iter().zip([1.0, -2.0, 3.0]) {
        assert!((found - expected).abs() < 1e-14);
    }
}
