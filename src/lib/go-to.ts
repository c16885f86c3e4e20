/** Leaves the product for another site's page. */
export function goTo(url: string): void {
  window.location.assign(url)
}
