export * from './content';
export * from './instrument';
export * from './view';
