package org.shearbook.desk.demonstration;

import java.util.Locale;
import org.shearbook.desk.shell.PageBanner;
import org.springframework.context.MessageSource;
import org.springframework.context.annotation.Profile;
import org.springframework.stereotype.Component;

/** Caution N9 over every page of the demonstration. */
@Component
@Profile("demo")
class DemonstrationBanner implements PageBanner {

    private final MessageSource messages;

    DemonstrationBanner(MessageSource messages) {
        this.messages = messages;
    }

    @Override
    public String text() {
        return messages.getMessage("caution.N9", null, Locale.ENGLISH);
    }
}
