const own = new Set<string>();

/** An id for a change made in this tab. */
export function newMutationId(): string {
  const id = crypto.randomUUID();
  own.add(id);
  return id;
}

/** Whether a step was asked for in this tab, and not by somebody else. */
export function isOwnMutation(mutationId: string): boolean {
  return own.has(mutationId);
}
