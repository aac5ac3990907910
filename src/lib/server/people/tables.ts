export * from './tables/persons';
export * from './tables/shops';
export * from './tables/events';
