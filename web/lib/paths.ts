/** Every address of the application, in one place. */
export const paths = {
  shelf: () => '/',
  newPattern: () => '/new',
  recording: (patternId: string) => `/patterns/${patternId}/recording`,
  bench: (patternId: string, lineId?: string) => `/patterns/${patternId}/bench${lineId ? `?line=${lineId}` : ''}`,
  sheet: (patternId: string) => `/patterns/${patternId}/sheet`,
  editions: (patternId: string) => `/patterns/${patternId}/editions`,
  studio: () => '/studio',
  account: () => '/account',
  signIn: (next?: string) => `/sign-in${next ? `?next=${encodeURIComponent(next)}` : ''}`,
  signUp: () => '/sign-up',
  forgotten: () => '/forgotten',
} as const;
