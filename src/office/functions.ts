/** Entry of functions.js, which every host loads as a classic script. */
import * as functions from "../functions";
import { register } from "./register";

register(functions);
