//! A practice's logo, made safe to embed in an archive.

use std::io::Cursor;

use image::ImageFormat;

/// A raster picture as an 8-bit PNG: greys and colours as RGB, so that no colour space or profile of the original
/// reaches the archive, and the same picture always gives the same bytes.
#[derive(Clone, Debug, PartialEq)]
pub struct Logo {
    png: Vec<u8>,
    width: u32,
    height: u32,
}

/// Least and greatest width and height in pixels.
pub const SIDES: std::ops::RangeInclusive<u32> = 8..=6000;

impl Logo {
    /// Reads a PNG or JPEG file.
    ///
    /// # Errors
    /// Says in words why the picture cannot be used.
    pub fn read(bytes: &[u8]) -> Result<Logo, String> {
        let format = image::guess_format(bytes).map_err(|_| "not a PNG or JPEG picture".to_string())?;
        if !matches!(format, ImageFormat::Png | ImageFormat::Jpeg) {
            return Err("not a PNG or JPEG picture".into());
        }
        let mut reader = image::ImageReader::with_format(Cursor::new(bytes), format);
        let mut limits = image::Limits::default();
        limits.max_image_width = Some(*SIDES.end());
        limits.max_image_height = Some(*SIDES.end());
        reader.limits(limits);
        let picture = reader.decode().map_err(|e| format!("the picture cannot be read: {e}"))?;
        let (width, height) = (picture.width(), picture.height());
        if !SIDES.contains(&width) || !SIDES.contains(&height) {
            return Err(format!("{width} by {height} pixels is too small for a logo"));
        }
        let mut png = Vec::new();
        let written = if picture.color().has_alpha() {
            picture.to_rgba8().write_to(&mut Cursor::new(&mut png), ImageFormat::Png)
        } else {
            picture.to_rgb8().write_to(&mut Cursor::new(&mut png), ImageFormat::Png)
        };
        written.map_err(|e| format!("the picture cannot be kept: {e}"))?;
        Ok(Logo { png, width, height })
    }

    pub(crate) fn png(&self) -> &[u8] {
        &self.png
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn a_grey_picture_becomes_rgb_and_other_files_are_refused() {
        let grey = image::GrayImage::from_pixel(20, 10, image::Luma([90]));
        let mut file = Vec::new();
        grey.write_to(&mut Cursor::new(&mut file), ImageFormat::Png).unwrap();
        let logo = Logo::read(&file).unwrap();
        assert_eq!((logo.width, logo.height), (20, 10));
        assert_eq!(image::load_from_memory(logo.png()).unwrap().color(), image::ColorType::Rgb8);
        assert!(Logo::read(b"<svg xmlns='http://www.w3.org/2000/svg'/>").unwrap_err().contains("PNG or JPEG"));
        assert!(Logo::read(&file[..30]).unwrap_err().contains("cannot be read"));
    }
}
