package bedmark.wording;

import java.util.List;

/** A part of a calculation sheet, from the top down; how it is set is the business of who shows it. */
public sealed interface SheetPart {

    /** The head of a section. */
    record Heading(String text) implements SheetPart {
    }

    /** Things one after the other: what was read, what stands in the register. */
    record Flow(List<String> items) implements SheetPart {
        public Flow {
            items = List.copyOf(items);
        }
    }

    /**
     * A formula or a finding.
     *
     * @param lead a word ahead of the name; empty where there is none
     * @param name with its source
     * @param text what is said of it
     */
    record Row(String lead, String name, String text) implements SheetPart {
    }

    /** A sentence in a list. */
    record Item(String text) implements SheetPart {
    }

    /** A sentence that stands by itself. */
    record Sentence(String text) implements SheetPart {
    }
}
