package bedmark.screen.zone;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.form.FieldForm;
import bedmark.index.Store;
import bedmark.index.StoreOptions;
import bedmark.journal.QuickLayer;
import bedmark.json.BundleReader;
import bedmark.quantity.UnitSystem;
import bedmark.screen.Glass;
import bedmark.screen.Listening;
import bedmark.screen.Scribe;
import bedmark.screen.part.FieldBox;
import bedmark.screen.theme.Density;
import bedmark.screen.theme.Light;
import bedmark.survey.Act;
import bedmark.survey.Assessor;
import bedmark.survey.Bundle;
import bedmark.survey.Survey;
import bedmark.wording.Wording;
import bedmark.words.Words;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Clock;
import java.time.OffsetDateTime;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.UUID;
import javafx.scene.Scene;
import javafx.scene.layout.StackPane;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.testfx.util.WaitForAsyncUtils;

/** A long form costs at its opening what a short one does: the rows in sight; the others come while nobody waits. */
class LongFormTest {
    @TempDir
    private Path temp;

    private Bundle plant;
    private Store store;
    private Scribe scribe;

    @BeforeEach
    void openAStore() throws Exception {
        plant = BundleReader.read(Files.readAllBytes(Path.of("sample-surveys/round-under-way.json")));
        store = Store.open(temp.resolve("store"), StoreOptions.of("tablet").withFiles(new QuickLayer()));
        scribe = new Scribe(store, Runnable::run);
    }

    @AfterEach
    void close() {
        scribe.close();
        store.close();
    }

    private ZoneModel model(FieldForm form) {
        UUID id = UUID.randomUUID();
        store.append("A. Vale", new Act.SurveyOpened(id, Survey.begin(id, "r", "TP-22", form.id(), form.version(),
                "A. Vale", OffsetDateTime.now()).document()));
        return new ZoneModel(new ZoneSetting(form, store.history(id).orElseThrow(), plant.register(),
                new Assessor(plant.register()), List.of(), Optional.empty(), scribe, "A. Vale", Clock.systemUTC()),
                UnitSystem.METRIC, Locale.ENGLISH);
    }

    private FormPane show(int fields) throws Exception {
        return Glass.on(() -> {
            FormPane pane = new FormPane(model(LongForms.of(fields)),
                    new Wording(new Words(Locale.ENGLISH), UnitSystem.METRIC), new Listening(), false);
            Glass.show(new StackPane(pane), Light.DAY, Density.standard(), 490, 300);
            return pane;
        });
    }

    private static int boxes(FormPane pane) {
        return (int) pane.lookupAll(".field-box").stream().filter(FieldBox.class::isInstance).count();
    }

    @Test
    void longFormOpensWithAsManyRowsAsAShortOneAndComesWholeInTheEnd() throws Exception {
        int[] first = new int[2];
        FormPane[] panes = new FormPane[2];
        for (int i = 0; i < 2; i++) {
            int fields = i == 0 ? 20 : 200;
            int at = i;
            panes[i] = Glass.on(() -> {
                FormPane pane = show(fields);
                first[at] = boxes(pane);
                return pane;
            });
        }
        assertEquals(first[0], first[1], "both build as many rows at once");
        assertTrue(first[0] < 20);
        WaitForAsyncUtils.waitForFxEvents(100);
        assertEquals(20, Glass.on(() -> boxes(panes[0])));
        assertEquals(200, Glass.on(() -> boxes(panes[1])));
    }

    @Test
    void rowThatWasNotBuiltYetIsLedToAllTheSame() throws Exception {
        Glass.on(() -> {
            ZoneModel model = model(LongForms.of(200));
            FormPane pane = new FormPane(model, new Wording(new Words(Locale.ENGLISH), UnitSystem.METRIC),
                    new Listening(), false);
            Scene scene = Glass.show(new StackPane(pane), Light.DAY, Density.standard(), 490, 300);
            model.activate(model.slots().get(180));
            FieldBox box = pane.activeBox().orElseThrow();
            assertTrue(box.activeProperty().get());
            scene.getWindow().hide();
            return null;
        });
    }
}
