package dev.leadline.chart;

import dev.leadline.problem.Problem;
import dev.leadline.problem.Refusal;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.Locale;
import javax.imageio.IIOImage;
import javax.imageio.ImageIO;
import javax.imageio.ImageTypeSpecifier;
import javax.imageio.metadata.IIOInvalidTreeException;
import javax.imageio.metadata.IIOMetadataNode;
import org.jfree.svg.SVGGraphics2D;
import org.jfree.svg.ViewBox;

/// Pictures as the bytes of a file: always light, with the caption inside as text, the same bytes for the same
/// picture.
public enum Export {
    PNG,
    SVG;

    /// A pixel of a picture is a 96th of an inch on paper.
    private static final double PIXELS_PER_INCH = 96;

    /// What is written into a file of this name; the ending decides.
    ///
    /// @throws Refusal for any other ending
    public static Export of(Path file) {
        String name = String.valueOf(file.getFileName()).toLowerCase(Locale.ROOT);
        if (name.endsWith(".png")) {
            return PNG;
        }
        if (name.endsWith(".svg")) {
            return SVG;
        }
        throw new Refusal(Problem.of("the figure %s is neither .png nor .svg".formatted(file.getFileName()))
                .because("The ending decides what is written.")
                .tryThis("End its name in .png or .svg."));
    }

    /// A picture of `width` by `height` pixels at 96 to the inch.
    ///
    /// @param dpi dots to the inch of an image, which the file declares; the size on paper does not depend on it
    public byte[] bytes(Subject subject, View view, int width, int height, int dpi) {
        return switch (this) {
            case PNG -> png(subject, view, width, height, dpi);
            case SVG -> svg(subject, view, width, height).getBytes(StandardCharsets.UTF_8);
        };
    }

    private static String svg(Subject subject, View view, int width, int height) {
        var picture = Picture.of(subject, view, Theme.LIGHT, width, height);
        var g = new SVGGraphics2D(picture.width(), picture.height());
        g.setDefsKeyPrefix("picture-");
        g.setFontFunction(family -> family.equals("DejaVu Sans") ? "DejaVu Sans, Verdana, sans-serif" : family);
        g.setGeomDoubleConverter(Export::hundredths);
        picture.draw(g);
        String drawing = g.getSVGElement(null, true, new ViewBox(0, 0, picture.width(), picture.height()), null, null);
        int end = drawing.indexOf('>', drawing.indexOf("<svg")) + 1;
        return drawing.substring(0, end - 1) + " role=\"img\"><title>" + escaped(subject.title()) + "</title><desc>"
                + escaped(subject.caption()) + "</desc>" + drawing.substring(end) + "\n";
    }

    private static byte[] png(Subject subject, View view, int width, int height, int dpi) {
        var image = Picture.of(subject, view, Theme.LIGHT, width, height).image(dpi / PIXELS_PER_INCH);
        var writer = ImageIO.getImageWritersByFormatName("png").next();
        try (var bytes = new ByteArrayOutputStream();
                var out = ImageIO.createImageOutputStream(bytes)) {
            var metadata = writer.getDefaultImageMetadata(ImageTypeSpecifier.createFromRenderedImage(image), null);
            var root = new IIOMetadataNode("javax_imageio_png_1.0");
            root.appendChild(resolution(dpi));
            root.appendChild(texts(subject));
            metadata.mergeTree("javax_imageio_png_1.0", root);
            writer.setOutput(out);
            writer.write(new IIOImage(image, null, metadata));
            out.flush();
            return bytes.toByteArray();
        } catch (IIOInvalidTreeException e) {
            throw new IllegalStateException(e);
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        } finally {
            writer.dispose();
        }
    }

    private static IIOMetadataNode resolution(int dpi) {
        var perMetre = Long.toString(Math.round(dpi / .0254));
        var node = new IIOMetadataNode("pHYs");
        node.setAttribute("pixelsPerUnitXAxis", perMetre);
        node.setAttribute("pixelsPerUnitYAxis", perMetre);
        node.setAttribute("unitSpecifier", "meter");
        return node;
    }

    private static IIOMetadataNode texts(Subject subject) {
        var node = new IIOMetadataNode("iTXt");
        node.appendChild(text("Title", subject.title()));
        node.appendChild(text("Description", subject.caption()));
        return node;
    }

    private static IIOMetadataNode text(String keyword, String text) {
        var node = new IIOMetadataNode("iTXtEntry");
        node.setAttribute("keyword", keyword);
        node.setAttribute("compressionFlag", "FALSE");
        node.setAttribute("compressionMethod", "0");
        node.setAttribute("languageTag", "en");
        node.setAttribute("translatedKeyword", keyword);
        node.setAttribute("text", text);
        return node;
    }

    /// Finer than any eye or printer, and a file of half the size.
    private static String hundredths(double pixel) {
        double rounded = Math.rint(pixel * 100) / 100;
        return rounded == Math.rint(rounded) ? Long.toString((long) rounded) : Double.toString(rounded);
    }

    private static String escaped(String text) {
        return text.replace("&", "&amp;").replace("<", "&lt;").replace(">", "&gt;");
    }
}
