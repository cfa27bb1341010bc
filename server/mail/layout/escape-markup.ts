const entities: Readonly<Record<string, string>> = {
  '&': '&amp;',
  '<': '&lt;',
  '>': '&gt;',
  '"': '&quot;',
  "'": '&#39;',
};

/** Text made safe inside elements and quoted attributes of HTML or MJML. */
export const escapeMarkup = (text: string): string =>
  text.replace(/[&<>"']/g, (character) => entities[character] ?? character);
