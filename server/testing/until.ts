/** Waits until something is so; fails when it does not come about in time. */
export async function until(holds: () => boolean | Promise<boolean>, forMs = 8_000) {
  const end = performance.now() + forMs
  while (!(await holds())) {
    if (performance.now() > end) throw new Error('did not come about in time')
    await new Promise(resolve => setTimeout(resolve, 20))
  }
}
