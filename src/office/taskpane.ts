import { startPane } from "../pane/pane";

startPane(document.body);
