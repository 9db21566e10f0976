import packageFile from '../package.json' with { type: 'json' }

export const version = packageFile.version
