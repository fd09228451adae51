/** Every address of the application, in one place. */
export const paths = {
  shelf: () => '/',
  newPattern: () => '/new',
  writtenPattern: () => '/new/written',
  /** A page of its own, with its own scripts: links to it load it whole. */
  count: () => '/count',
  recording: (patternId: string) => `/patterns/${patternId}/recording`,
  reading: (patternId: string, readingId: string) => `/patterns/${patternId}/reading/${readingId}`,
  held: (patternId: string, recordingId?: string) =>
    `/patterns/${patternId}/recording/held${recordingId ? `?recording=${recordingId}` : ''}`,
  bench: (patternId: string, lineId?: string) => `/patterns/${patternId}/bench${lineId ? `?line=${lineId}` : ''}`,
  card: (patternId: string) => `/patterns/${patternId}/card`,
  sheet: (patternId: string) => `/patterns/${patternId}/sheet`,
  editions: (patternId: string) => `/patterns/${patternId}/editions`,
  studio: () => '/studio',
  openStudio: () => '/studio/open',
  account: () => '/account',
  signIn: (next?: string) => `/sign-in${next ? `?next=${encodeURIComponent(next)}` : ''}`,
  signUp: (wants?: 'studio') => `/sign-up${wants ? `?for=${wants}` : ''}`,
  confirm: () => '/confirm',
  reset: () => '/reset',
  invitation: () => '/invitation',
  forgotten: () => '/forgotten',
} as const;
