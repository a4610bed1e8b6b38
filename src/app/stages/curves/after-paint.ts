/**
 * Runs work in a task of its own once the browser has painted the frame under way, so that it delays nothing in it.
 *
 * @returns takes the work back while it waits
 */
export function afterPaint(work: () => void): () => void {
  let task: ReturnType<typeof setTimeout> | undefined;
  const frame = requestAnimationFrame(() => {
    task = setTimeout(work);
  });
  return () => {
    cancelAnimationFrame(frame);
    clearTimeout(task);
  };
}
