package org.shearbook.desk.staff;

import org.shearbook.desk.audit.AsKnownAt;
import org.shearbook.desk.shell.Show;
import org.shearbook.desk.shell.StatusLine;
import org.springframework.core.annotation.Order;
import org.springframework.stereotype.Component;

/** Who holds the desk, in the top bar of every page. */
@Component
@Order(1)
class DeskHolderLine implements StatusLine {

    private final DeskHoldingBook holdings;
    private final PersonBook people;
    private final Show show;

    DeskHolderLine(DeskHoldingBook holdings, PersonBook people, Show show) {
        this.holdings = holdings;
        this.people = people;
        this.show = show;
    }

    @Override
    public String label() {
        return holdings.find(AsKnownAt.now()).filter(holding -> !holding.isVacant()).isPresent() ? "Desk held by" : "Desk";
    }

    @Override
    public String text() {
        DeskHolding holding = holdings.find(AsKnownAt.now()).orElse(null);
        if (holding == null) {
            return "vacant";
        }
        if (holding.holder() == null) {
            return "vacant since " + show.utc(holding.since());
        }
        String name = people.find(holding.holder(), AsKnownAt.now()).map(Person::displayName).orElse(holding.holder());
        return name + " since " + show.utc(holding.since());
    }
}
