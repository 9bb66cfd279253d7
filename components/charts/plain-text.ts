/** Plotly reads a little HTML in every text; a name somebody typed is shown as it was typed. */
export function plainText(text: string): string {
  return text.replaceAll('&', '&amp;').replaceAll('<', '&lt;').replaceAll('>', '&gt;');
}
