export * from '../../../../tests/support/shops';
