package dev.leadline.desktop.background;

import java.util.concurrent.Callable;
import java.util.function.Consumer;

/// Where slow work goes, and the way back to what a person sees.
///
/// Whatever is handed in as a consumer runs on the window's thread, one at a time; work runs anywhere else.
public interface Background {
    /// Exactly one of the consumers is called, later.
    <T> void run(Callable<T> work, Consumer<T> onResult, Consumer<Throwable> onFailure);

    /// A sink that any thread may feed as fast as it likes; `show` sees the newest value, at most 30 times a second.
    /// The last value fed is always shown.
    <T> Consumer<T> latest(Consumer<T> show);
}
