// Next's 'server-only' marker has no meaning under the test runner, so it resolves to this empty module.
export {};
