package dev.leadline.desktop.run;

import dev.leadline.model.Project;
import dev.leadline.study.StudyState;
import java.util.ArrayList;
import java.util.List;
import java.util.function.Consumer;

/// Runs that do only what the test says.
public final class HeldStudies implements Studies {
    public final List<String> heard = new ArrayList<>();
    public Project project;
    public Consumer<StudyState> listener;
    public RuntimeException fault;

    @Override
    public Going start(Project newProject, int threads, Consumer<StudyState> newListener) {
        project = newProject;
        listener = newListener;
        heard.add("start on " + threads);
        return new Going() {
            @Override
            public void pause() {
                heard.add("pause");
            }

            @Override
            public void resume() {
                heard.add("resume");
            }

            @Override
            public void stop() {
                heard.add("stop");
            }

            @Override
            public void await() {
                if (fault != null) {
                    throw fault;
                }
            }

            @Override
            public void close() {
                heard.add("close");
            }
        };
    }
}
