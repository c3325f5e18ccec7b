package bedmark.survey;

import bedmark.document.Branch;
import bedmark.document.Node;
import java.util.ArrayList;
import java.util.List;

/** Takes bundles into a store that has nothing yet, as the acts that do so. */
public final class Adoption {
    private Adoption() {
    }

    /**
     * The register, its forms and rounds, from the newest bundle that has them; all forms and rounds of the others
     * that it lacks; and what else stands in the newest beside them.
     */
    public static Act register(List<Bundle> bundles) {
        Bundle newest = bundles.get(bundles.size() - 1);
        return new Act.RegisterTaken(newest.unknown()
                .with("plant", newest.register().document())
                .with("forms", series(bundles, "forms"))
                .with("rounds", series(bundles, "rounds")));
    }

    private static Node series(List<Bundle> bundles, String key) {
        List<String> ids = new ArrayList<>();
        List<Node> items = new ArrayList<>();
        for (int i = bundles.size() - 1; i >= 0; i--) {
            for (Branch item : bundles.get(i).document().branches(key)) {
                String id = item.text("id").orElse("");
                if (!ids.contains(id)) {
                    ids.add(id);
                    items.add(item);
                }
            }
        }
        return new Node.Series(items);
    }

    /**
     * The surveys of a bundle: finished ones of a finished round as results from elsewhere; those of a round under
     * way go on here.
     *
     * @param underWay whether the bundle's round goes on on this tablet
     */
    public static List<Act> surveys(Bundle bundle, boolean underWay) {
        List<Act> acts = new ArrayList<>();
        for (Survey survey : bundle.surveys()) {
            Branch document = survey.document().without("assessment");
            if (!underWay) {
                acts.add(new Act.SurveyTaken(survey.id(), document));
                continue;
            }
            acts.add(new Act.SurveyOpened(survey.id(), document.without("completedAt").without("signedOffBy")));
            if (survey.completedAt().isPresent()) {
                acts.add(new Act.SurveyCompleted(survey.id(), document.text("signedOffBy").orElse(""),
                        survey.completedAt()));
            }
        }
        return acts;
    }
}
