export * from './account';
export * from './floor';
export * from './library';
export * from './mail';
export * from './orders';
export * from './plan';
export * from './plant';
export * from './record';
