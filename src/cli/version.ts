import about from '../../package.json' with { type: 'json' }

export const version = about.version
