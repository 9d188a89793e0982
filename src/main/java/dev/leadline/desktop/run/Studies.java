package dev.leadline.desktop.run;

import dev.leadline.model.Project;
import dev.leadline.study.Study;
import dev.leadline.study.StudyState;
import java.util.function.Consumer;

/// Where runs come from.
public interface Studies {
    /// A run under way.
    interface Going {
        void pause();

        void resume();

        void stop();

        /// Waits until it has ended; throws what made it fail.
        void await() throws InterruptedException;

        /// Stops, and waits for its threads to end.
        void close();
    }

    /// Starts at once. Called away from the window's thread.
    ///
    /// @param listener gets newer and newer states from any thread, the finished one last
    Going start(Project project, int threads, Consumer<StudyState> listener);

    /// Runs on this machine's engine.
    static Studies engine() {
        return (project, threads, listener) -> {
            var study = Study.start(project.question(), project.plan(), threads, listener);
            return new Going() {
                @Override
                public void pause() {
                    study.pause();
                }

                @Override
                public void resume() {
                    study.resume();
                }

                @Override
                public void stop() {
                    study.stop();
                }

                @Override
                public void await() throws InterruptedException {
                    study.await();
                }

                @Override
                public void close() {
                    study.close();
                }
            };
        };
    }
}
