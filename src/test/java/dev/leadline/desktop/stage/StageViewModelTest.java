package dev.leadline.desktop.stage;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.chart.ErrorDecay;
import dev.leadline.chart.PictureKind;
import dev.leadline.chart.View;
import dev.leadline.desktop.Drafts;
import dev.leadline.desktop.background.HeldBackground;
import dev.leadline.desktop.run.HeldStudies;
import dev.leadline.desktop.run.RunViewModel;
import dev.leadline.desktop.working.ProjectViewModel;
import java.util.Optional;
import javafx.beans.property.BooleanProperty;
import javafx.beans.property.SimpleBooleanProperty;
import org.junit.jupiter.api.Test;

class StageViewModelTest {
    private final HeldBackground background = new HeldBackground();
    private final ProjectViewModel project = new ProjectViewModel(Drafts.mean(), background);
    private final RunViewModel run = new RunViewModel(new HeldStudies(), background);
    private final BooleanProperty dark = new SimpleBooleanProperty();
    private final StageViewModel stage = new StageViewModel(project, run, dark, background);

    @Test
    void drawsTheQuestionBeforeAnyRun() {
        stage.size(640, 480, 1);
        assertEquals(Optional.empty(), stage.drawn().get());
        background.finishAll();
        var image = stage.drawn().get().orElseThrow().image();
        assertEquals(640, image.getWidth());
        assertEquals(480, image.getHeight());
    }

    @Test
    void wishesCollapseIntoTheNewest() {
        stage.size(640, 480, 1);
        background.finishAll();
        stage.size(641, 480, 1);
        stage.size(642, 480, 1);
        stage.size(643, 480, 1);
        assertEquals(1, background.waiting());
        background.finishNext();
        assertEquals(1, background.waiting());
        background.finishAll();
        assertEquals(643, stage.drawn().get().orElseThrow().image().getWidth());
    }

    @Test
    void theSamePictureIsNotDrawnTwice() {
        stage.size(640, 480, 1);
        background.finishAll();
        stage.size(640, 480, 1);
        assertEquals(0, background.waiting());
    }

    @Test
    void drawsForTheScreensPixelsAndForTheDark() {
        stage.size(640, 480, 2);
        background.finishAll();
        var light = stage.drawn().get().orElseThrow().image();
        assertEquals(1280, light.getWidth());
        dark.set(true);
        background.finishAll();
        assertNotEquals(
                light.getRGB(2, 2), stage.drawn().get().orElseThrow().image().getRGB(2, 2));
    }

    @Test
    void zoomsAndFollowsAgain() {
        stage.size(640, 480, 1);
        background.finishAll();
        stage.zoom(300, 200, .5);
        assertTrue(stage.view().get().draws().isPresent());
        background.finishAll();
        stage.reset();
        assertEquals(View.FOLLOWING, stage.view().get());
        stage.logDraws().set(false);
        assertEquals(false, stage.view().get().logDraws());
    }

    @Test
    void nothingIsReadOutsideThePlot() {
        stage.size(640, 480, 1);
        background.finishAll();
        assertEquals(Optional.empty(), stage.at(1, 1));
        assertTrue(stage.at(320, 240).isPresent());
    }

    @Test
    void anotherPictureFollowsTheRunAgain() {
        stage.size(640, 480, 1);
        background.finishAll();
        stage.zoom(300, 200, .5);
        background.finishAll();
        stage.kind().set(PictureKind.ERROR_DECAY);
        assertEquals(View.FOLLOWING, stage.view().get());
        background.finishAll();
        assertTrue(stage.subject().orElseThrow() instanceof ErrorDecay);
    }
}
