/*
 * What the server wrote for the page's script: one JSON island, <script type="application/json" id="…">. Keys carry
 * their units. An island that is missing is an error of the page; the message says which one.
 */
export function pageValues(root, id) {
  const island = root.getElementById(id);
  if (!island) throw new Error(`the page has no values called ${id}`);
  try {
    return JSON.parse(island.textContent);
  } catch (cause) {
    throw new Error(`the values called ${id} cannot be read`, { cause });
  }
}
