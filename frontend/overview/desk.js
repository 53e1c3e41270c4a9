/* The Desk: its only script is the small time–height display. */
export { mount } from '../timeheight/display.js';
