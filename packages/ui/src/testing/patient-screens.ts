import { configure } from "@testing-library/react";

// A screen's next state may wait for a busy machine; the test itself still ends in time.
configure({ asyncUtilTimeout: 10_000 });
