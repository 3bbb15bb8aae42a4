// Ink asks for React's developer tools only where DEV is set; they are not installed.
export default {initialize() {}, connectToDevTools() {}};
