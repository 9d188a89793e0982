package dev.leadline.desktop.picker;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.leadline.density.Knowledge;
import dev.leadline.desktop.Drafts;
import dev.leadline.desktop.background.HeldBackground;
import dev.leadline.desktop.working.Edits;
import dev.leadline.desktop.working.InputsViewModel;
import dev.leadline.desktop.working.ProjectViewModel;
import dev.leadline.model.Draft;
import dev.leadline.project.DataFolder;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import javafx.beans.property.SimpleBooleanProperty;
import org.junit.jupiter.api.Test;

class PickerViewModelTest {
    private final HeldBackground background = new HeldBackground();
    private final ProjectViewModel project = new ProjectViewModel(Drafts.mean(), background);
    private final InputsViewModel inputs = new InputsViewModel(project);
    private final PickerViewModel picker =
            new PickerViewModel(project, inputs, new SimpleBooleanProperty(), background);

    private void open() {
        picker.size(600, 300, 1);
        inputs.open(0);
        background.finishAll();
    }

    private double mean() {
        return picker.drawn().get().orElseThrow().picture().portrait().mean();
    }

    @Test
    void drawsTheDensityOfTheOpenedInput() {
        open();
        assertEquals(Optional.of(Way.Given.FAMILY), picker.way().get());
        assertEquals(.5, mean());
        inputs.close();
        assertTrue(picker.drawn().get().isEmpty());
    }

    @Test
    void theLastDensityStaysWhileWhatIsTypedIsNone() {
        open();
        var member = new MemberViewModel(picker.at().get().orElseThrow());
        member.parameter("to", "-1");
        background.finishAll();
        assertTrue(picker.outdated().get());
        assertEquals(.5, mean());
        assertFalse(picker.problems().isEmpty());
        member.parameter("to", "4");
        background.finishAll();
        assertFalse(picker.outdated().get());
        assertEquals(2, mean());
    }

    @Test
    void aDrawingIsOutdatedWhileAFieldHoldsNoNumber() {
        open();
        var member = new MemberViewModel(picker.at().get().orElseThrow());
        member.parameter("to", "5,5");
        background.finishAll();
        assertTrue(picker.outdated().get());
        assertEquals(.5, mean());
        picker.ask();
        assertFalse(picker.outdated().get());
        assertEquals(List.of(), project.problems().get());
    }

    @Test
    void whatCouldNotBeReadStandsThereWhenThePickerIsOpenedAgain() {
        open();
        var limits = new Way.Known(Knowledge.named("limits"));
        picker.choose(limits);
        var known = picker.known(limits.knowledge(), picker.at().get().orElseThrow());
        known.type("low", "3");
        known.type("high", "5,5");
        inputs.close();
        inputs.open(0);
        background.finishAll();
        assertEquals(Optional.of(limits), picker.way().get());
        var again = picker.known(limits.knowledge(), picker.at().get().orElseThrow());
        assertEquals("3", again.text("low"));
        assertEquals("5,5", again.text("high"));
        assertTrue(again.isFaulty("high"));
        assertFalse(picker.problems().isEmpty());
        again.type("high", "5.5");
        inputs.close();
        inputs.open(0);
        background.finishAll();
        assertEquals(Optional.of(Way.Given.FAMILY), picker.way().get());
        assertEquals(4.25, mean());
    }

    @Test
    void wishesCollapseIntoTheNewest() {
        open();
        var member = new MemberViewModel(picker.at().get().orElseThrow());
        for (String text : new String[] {"2", "3", "4", "5", "6"}) {
            member.parameter("to", text);
        }
        // five checks of the project, and one drawing under way
        assertEquals(6, background.waiting());
        background.finishAll();
        assertEquals(3, mean());
    }

    /// Of values evenly spread from 0 to 1 seven tenths lie below .7.
    @Test
    void readsTheChancesUnderThePointer() {
        open();
        var picture = picker.drawn().get().orElseThrow().picture();
        double x = picture.xOf(.7);
        String reading = picker.reading(x, picture.plot().getCenterY()).orElseThrow();
        assertTrue(reading.matches("0\\.70* m: 70(\\.0)? % below, 30(\\.0)? % above \\(1 in 3\\.33\\)"), reading);
        assertTrue(picker.reading(picture.plot().getMinX() - 2, 10).isEmpty());
    }

    @Test
    void aBoundedRangeLeavesNothingToChoose() {
        project.replace(Drafts.integral(), Optional.<Path>empty(), DataFolder.of(Path.of(".")));
        open();
        assertTrue(picker.at().get().isEmpty());
        assertEquals(1, mean());
        project.edit("$.inputs[0].range", PickerViewModelTest::withoutEnd);
        assertEquals("$.inputs[0].drawFrom", picker.at().get().orElseThrow().path());
        assertTrue(picker.way().get().isEmpty());
        project.undo();
        assertTrue(picker.at().get().isEmpty());
    }

    private static Draft withoutEnd(Draft d) {
        return Edits.inputs(
                d,
                Edits.changed(
                        d.inputs(),
                        0,
                        in -> new Draft.InputDraft(
                                in.name(),
                                in.unit(),
                                in.label(),
                                in.provenance(),
                                new Draft.From.Range(0, Double.POSITIVE_INFINITY, Optional.empty()))));
    }

    @Test
    void anInputThatIsUndoneIsNoLongerLookedAt() {
        inputs.close();
        project.edit(
                "$.inputs",
                d -> Edits.inputs(d, Edits.with(d.inputs(), d.inputs().getFirst())));
        inputs.open(1);
        project.undo();
        assertTrue(inputs.opened().get().isEmpty());
        assertTrue(picker.at().get().isEmpty());
    }
}
