import about from '../../package.json';

/** Version of the program. */
export const VERSION: string = about.version;
