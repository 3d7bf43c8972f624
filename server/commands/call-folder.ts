/** The folder npm was called from; npm itself runs its scripts in the project's. */
export const callFolder = (): string => process.env['INIT_CWD'] ?? process.cwd()
