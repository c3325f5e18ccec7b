package bedmark.document;

import bedmark.quantity.BeltState;
import bedmark.quantity.Quality;
import bedmark.quantity.Quantity;
import bedmark.quantity.Unit;
import java.math.BigDecimal;
import java.time.DateTimeException;
import java.time.OffsetDateTime;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.UUID;

/**
 * An object of a document: keys in their written order. The typed readers return nothing for an absent (or blank)
 * key and refuse a value of the wrong kind, naming the key; the caller places the refusal with
 * {@link Defect#below(Pointer)} where the branch is not the root.
 */
public record Branch(Members members) implements Node {

    /** The empty object. */
    public static final Branch EMPTY = new Branch(Map.of());

    /** An object of a map's members, in its order. */
    public Branch(Map<String, Node> members) {
        this(Members.of(members));
    }

    /** An object of what was gathered. */
    public Branch(Members.Gathering gathered) {
        this(gathered.members());
    }

    public Optional<Node> get(String key) {
        Node node = members.get(key);
        return node == null || node instanceof Blank ? Optional.empty() : Optional.of(node);
    }

    public boolean has(String key) {
        Node node = members.get(key);
        return node != null && !(node instanceof Blank);
    }

    public Branch with(String key, Node value) {
        return new Branch(members.with(key, value));
    }

    public Branch with(String key, String value) {
        return with(key, Node.text(value));
    }

    public Branch with(String key, Quantity value) {
        return with(key, write(value));
    }

    public Branch without(String key) {
        return new Branch(members.without(key));
    }

    /** The value at a place below this branch. */
    public Optional<Node> at(Pointer place) {
        Node here = this;
        for (String token : place.tokens()) {
            if (here instanceof Branch branch) {
                here = branch.members.get(token);
            } else if (here instanceof Series series) {
                int index = Pointer.index(token);
                here = index >= 0 && index < series.items().size() ? series.items().get(index) : null;
            } else {
                return Optional.empty();
            }
            if (here == null) {
                return Optional.empty();
            }
        }
        return Optional.of(here);
    }

    /**
     * The same document with the value at a place of object keys set; objects on the way are made. A list is
     * replaced whole, never entered.
     *
     * @throws IllegalArgumentException where the place is the root or leads through something that is no object
     */
    public Branch with(Pointer place, Node value) {
        if (place.isRoot()) {
            throw new IllegalArgumentException("the root itself is not set");
        }
        String key = place.head();
        if (place.tokens().size() == 1) {
            return with(key, value);
        }
        Node below = members.getOrDefault(key, EMPTY);
        if (!(below instanceof Branch branch)) {
            throw new IllegalArgumentException(key + " is no object");
        }
        return with(key, branch.with(place.tail(), value));
    }

    /** The same document without the value at a place of object keys; emptied objects stay. */
    public Branch without(Pointer place) {
        String key = place.head();
        if (place.tokens().size() == 1) {
            return without(key);
        }
        return members.get(key) instanceof Branch branch ? with(key, branch.without(place.tail())) : this;
    }

    public Optional<String> text(String key) {
        return get(key).map(node -> {
            if (node instanceof Text text) {
                return text.value();
            }
            throw wrongKind(key, "text");
        });
    }

    public Optional<BigDecimal> number(String key) {
        return get(key).map(node -> {
            if (node instanceof Decimal decimal) {
                return decimal.value();
            }
            throw wrongKind(key, "number");
        });
    }

    public Optional<Boolean> flag(String key) {
        return get(key).map(node -> {
            if (node instanceof Flag flag) {
                return flag.value();
            }
            throw wrongKind(key, "true-or-false");
        });
    }

    public Optional<Branch> branch(String key) {
        return get(key).map(node -> {
            if (node instanceof Branch branch) {
                return branch;
            }
            throw wrongKind(key, "object");
        });
    }

    /** The items of a list; none where the key is absent. */
    public List<Node> series(String key) {
        return get(key).map(node -> {
            if (node instanceof Series series) {
                return series.items();
            }
            throw wrongKind(key, "list");
        }).orElse(List.of());
    }

    /** The items of a list of objects; none where the key is absent. */
    public List<Branch> branches(String key) {
        List<Branch> branches = new ArrayList<>();
        List<Node> items = series(key);
        for (int i = 0; i < items.size(); i++) {
            if (!(items.get(i) instanceof Branch branch)) {
                throw new Refused(Defect.at(Pointer.of(key).child(i), "kind-wrong", "object"));
            }
            branches.add(branch);
        }
        return branches;
    }

    public Optional<UUID> uuid(String key) {
        return text(key).map(text -> {
            try {
                UUID id = UUID.fromString(text);
                if (id.toString().equalsIgnoreCase(text)) {
                    return id;
                }
            } catch (IllegalArgumentException e) {
                throw new Refused(Defect.at(Pointer.of(key), "uuid-wrong", text), e);
            }
            throw new Refused(Defect.at(Pointer.of(key), "uuid-wrong", text));
        });
    }

    public Optional<OffsetDateTime> time(String key) {
        return text(key).map(text -> {
            try {
                return OffsetDateTime.parse(text);
            } catch (DateTimeException e) {
                throw new Refused(Defect.at(Pointer.of(key), "time-wrong", text), e);
            }
        });
    }

    /** The quantity under a key. */
    public Optional<Quantity> quantity(String key) {
        return branch(key).map(branch -> Refused.below(Pointer.of(key), branch::asQuantity));
    }

    /** This object read as a quantity; its keys are those of the data page. */
    public Quantity asQuantity() {
        return members.quantity(this::readQuantity);
    }

    private Quantity readQuantity() {
        BigDecimal value = number("value").orElseThrow(() -> absent("value"));
        String code = text("unit").orElseThrow(() -> absent("unit"));
        Unit unit = Unit.ofCode(code)
                .orElseThrow(() -> new Refused(Defect.at(Pointer.of("unit"), "unit-unknown", code)));
        Optional<BigDecimal> uncertainty = number("standardUncertainty");
        if (uncertainty.isPresent() && uncertainty.get().signum() < 0) {
            throw new Refused(Defect.at(Pointer.of("standardUncertainty"), "number-negative",
                    uncertainty.get().toPlainString()));
        }
        Optional<Quality> quality = text("quality").map(word -> Quality.ofCode(word)
                .orElseThrow(() -> new Refused(Defect.at(Pointer.of("quality"), "word-unknown", word))));
        Optional<BeltState> beltState = text("beltState").map(word -> BeltState.ofCode(word)
                .orElseThrow(() -> new Refused(Defect.at(Pointer.of("beltState"), "word-unknown", word))));
        return new Quantity(value, unit, text("entered"), uncertainty, quality, time("at"), beltState);
    }

    /** A quantity as an object of a document. */
    public static Branch write(Quantity quantity) {
        Map<String, Node> members = new LinkedHashMap<>();
        members.put("value", new Decimal(quantity.value()));
        members.put("unit", new Text(quantity.unit().code()));
        quantity.entered().ifPresent(text -> members.put("entered", new Text(text)));
        quantity.standardUncertainty().ifPresent(u -> members.put("standardUncertainty", new Decimal(u)));
        quantity.quality().ifPresent(quality -> members.put("quality", new Text(quality.code())));
        quantity.at().ifPresent(at -> members.put("at", Node.time(at)));
        quantity.beltState().ifPresent(state -> members.put("beltState", new Text(state.code())));
        return new Branch(members);
    }

    private static Refused absent(String key) {
        return new Refused(Defect.at(Pointer.of(key), "key-absent", key));
    }

    private static Refused wrongKind(String key, String kind) {
        return new Refused(Defect.at(Pointer.of(key), "kind-wrong", kind));
    }
}
