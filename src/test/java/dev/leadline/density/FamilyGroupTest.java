package dev.leadline.density;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;

import java.util.List;
import org.junit.jupiter.api.Test;

class FamilyGroupTest {
    /// A family that no group names would be found only by its name.
    @Test
    void everyFamilyHasAGroup() {
        var groups = FamilyGroup.of(Catalogue.families());
        assertFalse(
                groups.containsKey(FamilyGroup.OTHER),
                () -> groups.get(FamilyGroup.OTHER).stream()
                        .map(Family::name)
                        .toList()
                        .toString());
        assertEquals(
                Catalogue.families().size(),
                groups.values().stream().mapToInt(List::size).sum());
    }
}
