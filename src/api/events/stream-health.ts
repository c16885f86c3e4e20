/** Whether this tab hears the club's events; queries poll more often while it does not. */
let open = false

export const streamHealth = {
  isOpen: () => open,
  set: (next: boolean) => {
    open = next
  },
}
