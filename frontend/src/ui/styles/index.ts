import './fonts.css';
import './base.css';
import './shell.css';
import './page.css';
import './table.css';
import './drawing.css';
import './print.css';
