package dev.leadline.project;

import java.util.Optional;

/// The version of this program, as its archive says it.
public final class Version {

    private Version() {}

    /// `unreleased` where the classes do not come from a built archive.
    public static String text() {
        return Optional.ofNullable(Version.class.getPackage().getImplementationVersion())
                .orElse("unreleased");
    }
}
