package org.shearbook.desk.shell.web;

import org.springframework.boot.context.properties.ConfigurationProperties;
import org.springframework.boot.context.properties.bind.DefaultValue;

/**
 * @param office name of the office, as it stands in the top bar and on prints
 */
@ConfigurationProperties("shearbook.shell")
record ShellSettings(@DefaultValue("Shearbook") String office) {
}
