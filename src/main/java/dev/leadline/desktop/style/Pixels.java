package dev.leadline.desktop.style;

import java.awt.image.BufferedImage;
import java.awt.image.DataBufferInt;
import java.nio.IntBuffer;
import javafx.scene.image.PixelBuffer;
import javafx.scene.image.PixelFormat;
import javafx.scene.image.WritableImage;

/// Drawn images as the window shows them.
public final class Pixels {
    private Pixels() {}

    /// The same pixels, not copied: nobody may draw into them any more.
    ///
    /// @param drawn premultiplied ARGB
    public static WritableImage shared(BufferedImage drawn) {
        int[] data = ((DataBufferInt) drawn.getRaster().getDataBuffer()).getData();
        return new WritableImage(new PixelBuffer<>(
                drawn.getWidth(), drawn.getHeight(), IntBuffer.wrap(data), PixelFormat.getIntArgbPreInstance()));
    }
}
