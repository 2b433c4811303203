export * from './people';
export * from './sittings';
export * from './papers';
export * from './sheets';
export * from './answers';
export * from './scans';
export * from './marks';
export * from './records';
