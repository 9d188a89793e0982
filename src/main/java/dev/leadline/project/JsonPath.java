package dev.leadline.project;

/// Places in a JSON text, as RFC 9535 writes them: `$.inputs[2].density.scale`.
final class JsonPath {

    static final String WHOLE = "$";

    private JsonPath() {}

    static String member(String path, String name) {
        return name.matches("[\\p{L}_][\\p{L}\\p{Nd}_]*") ? path + "." + name : path + "['" + Shown.plain(name) + "']";
    }

    static String element(String path, int index) {
        return path + "[" + index + "]";
    }

    /// Whether `path` is the place at `above`, or stands within it.
    static boolean within(String path, String above) {
        return path.startsWith(above)
                && (path.length() == above.length() || ".[".indexOf(path.charAt(above.length())) >= 0);
    }
}
