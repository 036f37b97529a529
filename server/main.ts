// React's fast build is chosen when it is first read, so the mode is set before anything that imports it.
process.env.NODE_ENV ??= process.env.TALLYKIN_MODE === 'development' ? 'development' : 'production'
await import('./serve.ts')

export {}
