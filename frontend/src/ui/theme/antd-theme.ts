import { theme } from 'antd';
import type { ThemeConfig } from 'antd';
import type { Palette } from './palette.js';

export const fontFamily = '"IBM Plex Sans", "Liberation Sans", Arial, sans-serif';

/**
 * Ink is the primary colour, so that a button never competes with the two colours that mean something.
 * One algorithm for both grounds, with every derived colour stated: the dark algorithm would shift them.
 */
export function antdTheme(p: Palette): ThemeConfig {
  return {
    algorithm: theme.defaultAlgorithm,
    token: {
      fontFamily, fontSize: 14, lineHeight: 1.5, wireframe: false, motionDurationMid: '0.1s', motionDurationSlow: '0.15s',
      borderRadius: 0, borderRadiusXS: 0, borderRadiusSM: 0, borderRadiusLG: 0,
      boxShadow: 'none', boxShadowSecondary: 'none', boxShadowTertiary: 'none',
      colorPrimary: p.ink, colorPrimaryHover: p.ink2, colorPrimaryActive: p.ink, colorPrimaryBg: p.hover, colorPrimaryBgHover: p.line2,
      colorPrimaryBorder: p.ink2, colorPrimaryText: p.ink, colorPrimaryTextHover: p.ink, colorPrimaryTextActive: p.ink,
      colorInfo: p.ink, colorInfoBg: p.sheet, colorInfoBorder: p.line,
      colorSuccess: p.settled, colorSuccessBg: p.settledTint, colorSuccessBorder: p.settled, colorSuccessText: p.settled,
      colorWarning: p.attention, colorWarningBg: p.attentionTint, colorWarningBorder: p.attention, colorWarningText: p.attention,
      colorError: p.attention, colorErrorBg: p.attentionTint, colorErrorBorder: p.attention, colorErrorText: p.attention,
      colorErrorHover: p.attention, colorErrorActive: p.attention, colorErrorBorderHover: p.attention, colorErrorBgHover: p.attentionTint,
      colorLink: p.ink, colorLinkHover: p.ink2, colorLinkActive: p.ink, linkDecoration: 'underline', linkHoverDecoration: 'underline',
      colorText: p.ink, colorTextBase: p.ink, colorTextSecondary: p.ink2, colorTextTertiary: p.ink2, colorTextQuaternary: p.ink3,
      colorTextPlaceholder: p.ink2, colorTextDisabled: p.ink2, colorTextHeading: p.ink, colorTextLabel: p.ink2, colorTextDescription: p.ink2,
      colorTextLightSolid: p.sheet, colorWhite: p.sheet, colorIcon: p.ink2, colorIconHover: p.ink,
      colorBgBase: p.sheet, colorBgContainer: p.sheet, colorBgElevated: p.sheet, colorBgLayout: p.paper, colorBgSpotlight: p.ink,
      colorBgContainerDisabled: p.line2, colorBgTextHover: p.hover, colorBgTextActive: p.line2, colorBgMask: 'rgba(10, 14, 14, 0.45)',
      colorFill: p.line, colorFillSecondary: p.line2, colorFillTertiary: p.hover, colorFillQuaternary: p.hover,
      colorFillContent: p.line2, colorFillContentHover: p.line, colorFillAlter: p.sheet,
      colorBorder: p.ink3, colorBorderSecondary: p.line, colorSplit: p.line, colorBorderDisabled: p.line,
      controlOutline: p.line, controlItemBgHover: p.hover, controlItemBgActive: p.line2, controlItemBgActiveHover: p.line2,
    },
    components: {
      Button: { primaryColor: p.sheet, primaryShadow: 'none', defaultShadow: 'none', dangerShadow: 'none', dangerColor: p.sheet, fontWeight: 500 },
      Table: {
        headerBg: p.sheet, headerColor: p.ink2, headerSplitColor: 'transparent', borderColor: p.line2, rowHoverBg: p.hover, footerBg: p.sheet,
        cellPaddingBlockSM: 8, cellPaddingInlineSM: 10, headerBorderRadius: 0, rowSelectedBg: p.hover, rowSelectedHoverBg: p.line2,
      },
      Select: { optionSelectedBg: p.line2, optionActiveBg: p.hover, optionSelectedFontWeight: 500 },
      Drawer: { zIndexPopup: 1000 },
      Modal: { contentBg: p.sheet, headerBg: p.sheet },
      Radio: { buttonSolidCheckedColor: p.sheet },
    },
  };
}
