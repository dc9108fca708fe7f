/** Keys of what a copy's reader asks for. */
export const copyKeys = {
  copy: (token: string) => ['copy', token] as const,
  standing: (token: string) => ['copy', token, 'standing'] as const,
  room: (token: string) => ['copy', token, 'room'] as const,
  questions: (token: string) => ['copy', token, 'questions'] as const,
};
