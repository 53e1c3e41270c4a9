/*
 * The one script every page loads. It starts the behaviours all pages share and then the page's own module, named
 * by <body data-page="room/name">. Modules do nothing on import; they export mount(root).
 */
import { mount as clock } from './elements/clock.js';
import { mount as keys } from './elements/keys.js';
import { mount as rows } from './elements/rows.js';
import { mount as display } from './elements/display-settings.js';
import { mount as errorSummary } from './elements/error-summary.js';
import { mount as pageTools } from './elements/page-tools.js';
import { mount as liveParts } from './elements/live-part.js';

const PAGE_NAME = /^[a-z][a-z0-9-]*(\/[a-z][a-z0-9-]*)+$/;

for (const mount of [display, clock, keys, rows, errorSummary, pageTools, liveParts]) mount(document);

const page = document.body.dataset.page;
if (page && PAGE_NAME.test(page)) {
  // relative to this file, so that the version in the address, if there is one, is kept
  const module = await import(new URL(`../${page}.js`, import.meta.url));
  await module.mount(document);
}
document.body.dataset.ready = 'yes';
