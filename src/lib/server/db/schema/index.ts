export * from './accounts';
export * from './people';
export * from './yard';
export * from './boats';
export * from './jobs';
export * from './forecasts';
export * from './changes';
export * from './workers';
